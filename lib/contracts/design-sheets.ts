import { z } from 'zod'
import { papers, sheetParts, sheetUnits } from '@/lib/sheet/sheet-parts'
import { idSchema } from './common'
import { operation } from './operation'
import { printedFields } from './printed'

const paper = z.enum(papers).default('A4')
const units = z.enum(sheetUnits).default('both')

export const printDesignSheet = operation({
  id: 'printDesignSheet',
  method: 'POST',
  path: '/api/v1/design-sheets',
  summary: 'The design sheet of a crank train at a speed and an angle, as PDF',
  for: 'anyone',
  limit: 'printing',
  body: z.object({
    ...printedFields,
    paper,
    units,
    parts: z.array(z.enum(sheetParts)).default([...sheetParts]),
    /** The saved version that the scene is or began as, printed on the sheet: for somebody signed in who may read it. */
    of: z.object({ sceneId: idSchema, version: z.int().min(1) }).optional(),
  }),
  status: 200,
  media: 'application/pdf',
  problems: { 404: 'No such scene or version' },
})

export const versionDesignSheet = operation({
  id: 'versionDesignSheet',
  method: 'GET',
  path: '/api/v1/scenes/{id}/versions/{number}/design-sheet.pdf',
  summary: 'The design sheet of a saved version, as PDF',
  for: 'person',
  limit: 'printing',
  params: z.object({ id: idSchema, number: z.coerce.number().int().min(1) }),
  query: z.object({ paper, units }),
  status: 200,
  media: 'application/pdf',
})

export const designSheetOperations = [printDesignSheet, versionDesignSheet]
