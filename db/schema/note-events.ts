import { bigint, index, jsonb, pgTable, uuid } from 'drizzle-orm/pg-core'
import { createdAt } from './columns'
import { notes } from './notes'
import { users } from './users'

/** What became of a note: settled, reopened, moved, of another kind. Append-only (a trigger of a hand-made migration). */
export const noteEvents = pgTable(
  'note_events',
  {
    id: bigint('id', { mode: 'number' }).primaryKey().generatedAlwaysAsIdentity(),
    noteId: uuid('note_id')
      .notNull()
      .references(() => notes.id),
    actorId: uuid('actor_id')
      .notNull()
      .references(() => users.id),
    what: jsonb('what').$type<unknown>().notNull(),
    createdAt: createdAt(),
  },
  (table) => [index('note_events_note').on(table.noteId, table.id)],
)
