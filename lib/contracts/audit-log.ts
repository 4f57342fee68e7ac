import { z } from 'zod'
import { idSchema, timeSchema } from './common'
import { operation } from './operation'

export const auditEntrySchema = z
  .object({
    /** Grows with time: the last of a page is where the next begins. */
    id: z.int(),
    at: timeSchema,
    /** Null where nobody was signed in, or a worker did it. */
    actor: z.object({ id: idSchema, name: z.string().nullable() }).nullable(),
    operation: z.string(),
    subject: z.string(),
    before: z.unknown(),
    after: z.unknown(),
  })
  .meta({ id: 'AuditEntry' })
export type AuditEntry = z.output<typeof auditEntrySchema>

const filters = z.object({
  actor: idSchema.optional(),
  /** An operation, such as "scene.save", or all of an area, such as "scene". */
  operation: z
    .string()
    .regex(/^[a-z]+(\.[a-z-]+)?$/)
    .max(60)
    .optional(),
  /** What it was done to, such as "scene:0190…". */
  subject: z.string().max(80).optional(),
  from: timeSchema.optional(),
  /** Up to, not with, this time. */
  to: timeSchema.optional(),
})
export type AuditFilters = z.output<typeof filters>

const byWorkshop = z.object({ id: idSchema })

export const listAudit = operation({
  id: 'listAudit',
  method: 'GET',
  path: '/api/v1/workshops/{id}/audit-log',
  summary: 'Who did what and when in a workshop, with what was before and after; newest first',
  for: 'person',
  limit: 'reading',
  params: byWorkshop,
  query: filters.extend({
    before: z.coerce.number().int().min(1).optional(),
    limit: z.coerce.number().int().min(1).max(100).default(50),
  }),
  status: 200,
  answer: z.object({ entries: z.array(auditEntrySchema), next: z.int().nullable() }),
})

const exported = {
  method: 'GET',
  for: 'person',
  limit: 'printing',
  params: byWorkshop,
  query: filters,
  status: 200,
} as const

export const auditCsv = operation({
  ...exported,
  id: 'auditCsv',
  path: '/api/v1/workshops/{id}/audit-log.csv',
  summary: 'The audit log as CSV, filtered as the list is; oldest first',
  media: 'text/csv',
})

export const auditJson = operation({
  ...exported,
  id: 'auditJson',
  path: '/api/v1/workshops/{id}/audit-log.json',
  summary: 'The audit log as a file of JSON, filtered as the list is; oldest first',
  answer: z.object({ entries: z.array(auditEntrySchema) }),
})

export const auditOperations = [listAudit, auditCsv, auditJson]
