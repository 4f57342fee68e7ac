import { sql } from 'drizzle-orm'
import { check, index, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, instant } from './columns'
import { users } from './users'

export const passwordResetTokens = pgTable(
  'password_reset_tokens',
  {
    tokenHash: text('token_hash').primaryKey(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    expiresAt: instant('expires_at').notNull(),
    usedAt: instant('used_at'),
    createdAt: createdAt(),
  },
  (table) => [
    index('password_reset_tokens_user').on(table.userId),
    check('password_reset_tokens_hash', sql`${table.tokenHash} ~ '^[0-9a-f]{64}$'`),
  ],
)
