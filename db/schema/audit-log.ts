import { bigint, index, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt } from './columns'

/**
 * Append-only (a trigger of the hand-made migration). No foreign keys: what it says stays true when the people
 * and things it names are gone.
 */
export const auditLog = pgTable(
  'audit_log',
  {
    id: bigint('id', { mode: 'number' }).primaryKey().generatedAlwaysAsIdentity(),
    workshopId: uuid('workshop_id'),
    actorId: uuid('actor_id'),
    operation: text('operation').notNull(),
    subject: text('subject').notNull(),
    before: jsonb('before').$type<unknown>(),
    after: jsonb('after').$type<unknown>(),
    createdAt: createdAt(),
  },
  (table) => [
    index('audit_log_workshop').on(table.workshopId, table.id),
    index('audit_log_actor').on(table.workshopId, table.actorId, table.id),
    index('audit_log_subject').on(table.subject, table.id),
  ],
)
