import { z } from 'zod'
import { papers, sheetUnits } from '@/lib/sheet/sheet-parts'
import { idSchema, timeSchema } from './common'
import { noteFilterSchema } from './notes'
import { operation } from './operation'

const ofVersion = { sceneId: idSchema, version: z.int().min(1) }

/** What can be made in the background: a line a kind. */
export const wantedSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('design-sheet'),
    ...ofVersion,
    paper: z.enum(papers).default('A4'),
    units: z.enum(sheetUnits).default('both'),
  }),
  /** Notes as they stand in the version, with a picture of each one's view; all, or those that match. */
  z.object({
    kind: z.literal('notes-pdf'),
    ...ofVersion,
    filter: noteFilterSchema.omit({ version: true }).default({}),
  }),
])
export type Wanted = z.output<typeof wantedSchema>

export const exportSchema = z
  .object({
    id: idSchema,
    kind: z.string(),
    sceneId: idSchema,
    version: z.int(),
    state: z.enum(['waiting', 'made', 'failed']),
    /** Why it could not be made. */
    reason: z.string().nullable(),
    fileName: z.string().nullable(),
    fileUrl: z.string().nullable(),
    createdAt: timeSchema,
    endsAt: timeSchema,
  })
  .meta({ id: 'Export' })
export type ExportAnswer = z.output<typeof exportSchema>

const byExport = z.object({ id: idSchema })

export const askExport = operation({
  id: 'askExport',
  method: 'POST',
  path: '/api/v1/exports',
  summary: 'Have a file of a version made in the background; it is kept for seven days, for whoever asked',
  for: 'person',
  limit: 'printing',
  body: wantedSchema,
  status: 202,
  answer: exportSchema,
  problems: { 404: 'No such scene or version' },
})

export const readExport = operation({
  id: 'readExport',
  method: 'GET',
  path: '/api/v1/exports/{id}',
  summary: 'How far a file is that one has asked for',
  for: 'person',
  limit: 'reading',
  params: byExport,
  status: 200,
  answer: exportSchema,
})

export const exportFile = operation({
  id: 'exportFile',
  method: 'GET',
  path: '/api/v1/exports/{id}/file',
  summary: 'The file, once it is made',
  for: 'person',
  limit: 'reading',
  params: byExport,
  status: 200,
  media: 'application/pdf',
})

export const exportOperations = [askExport, readExport, exportFile]
