import { sql } from 'drizzle-orm'
import { check, index, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, instant } from './columns'
import { users } from './users'

/** The id is the SHA-256 of the token in the cookie: a copy of this table opens no session. */
export const sessions = pgTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    expiresAt: instant('expires_at').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    index('sessions_user').on(table.userId),
    index('sessions_expiry').on(table.expiresAt),
    check('sessions_id_is_hash', sql`${table.id} ~ '^[0-9a-f]{64}$'`),
  ],
)
