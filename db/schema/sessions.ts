import { sql } from 'drizzle-orm'
import { check, index, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, instant } from './columns'
import { users } from './users'

/** The id is the SHA-256 of the token in the cookie: a copy of this table opens no session. */
export const sessions = pgTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    /** What it is called by in lists: says nothing of the token. */
    name: uuid('name')
      .notNull()
      .unique()
      .default(sql`gen_random_uuid()`),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    userAgent: text('user_agent').notNull().default(''),
    lastSeenAt: instant('last_seen_at').notNull().defaultNow(),
    expiresAt: instant('expires_at').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    index('sessions_user').on(table.userId),
    index('sessions_expiry').on(table.expiresAt),
    check('sessions_id_is_hash', sql`${table.id} ~ '^[0-9a-f]{64}$'`),
    check('sessions_user_agent', sql`length(${table.userAgent}) <= 400`),
  ],
)
