import { jsonb, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt } from './columns'
import { users } from './users'

/** What a request sent twice under one key was answered, written in the transaction that did the work. */
export const idempotencyKeys = pgTable(
  'idempotency_keys',
  {
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    key: text('key').notNull(),
    requestHash: text('request_hash').notNull(),
    answer: jsonb('answer').$type<unknown>().notNull(),
    createdAt: createdAt(),
  },
  (table) => [primaryKey({ columns: [table.userId, table.key] })],
)
