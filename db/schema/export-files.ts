import { sql } from 'drizzle-orm'
import { check, index, jsonb, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { bytes, createdAt, idColumn, instant } from './columns'
import { users } from './users'
import { workshops } from './workshops'

export const exportStateEnum = pgEnum('export_state', ['waiting', 'made', 'failed'])

/** A file that somebody asked for and that is made in the background, kept for a week. */
export const exportFiles = pgTable(
  'exports',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id')
      .notNull()
      .references(() => workshops.id, { onDelete: 'cascade' }),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    wanted: jsonb('wanted').$type<unknown>().notNull(),
    state: exportStateEnum('state').notNull().default('waiting'),
    reason: text('reason'),
    media: text('media'),
    fileName: text('file_name'),
    file: bytes('file'),
    endsAt: instant('ends_at').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    index('exports_user').on(table.userId, table.createdAt),
    index('exports_end').on(table.endsAt),
    check('exports_made', sql`(${table.state} = 'made') = (${table.file} is not null)`),
  ],
)
