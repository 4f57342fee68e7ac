import { sql } from 'drizzle-orm'
import { boolean, check, index, pgEnum, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, instant } from './columns'
import { users } from './users'

export const mailKindEnum = pgEnum('mail_kind', [
  'mentions',
  'review-asked',
  'review-answered',
  'reminders',
  'questions',
])

/** Only what somebody has chosen: without a row a mail of that kind is wanted. */
export const mailPreferences = pgTable(
  'mail_preferences',
  {
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    kind: mailKindEnum('kind').notNull(),
    wanted: boolean('wanted').notNull(),
    updatedAt: instant('updated_at').notNull().defaultNow(),
  },
  (table) => [primaryKey({ columns: [table.userId, table.kind] })],
)

/** One a mail: whoever has the token may turn that kind of mail off for its reader, and nothing else. */
export const unsubscribeTokens = pgTable(
  'unsubscribe_tokens',
  {
    tokenHash: text('token_hash').primaryKey(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    kind: mailKindEnum('kind').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    index('unsubscribe_tokens_user').on(table.userId),
    index('unsubscribe_tokens_age').on(table.createdAt),
    check('unsubscribe_tokens_hash', sql`${table.tokenHash} ~ '^[0-9a-f]{64}$'`),
  ],
)
