import { sql } from 'drizzle-orm'
import { check, index, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { roleEnum } from './memberships'
import { users } from './users'
import { workshops } from './workshops'

/** Lets a program act for a person in one workshop, as one role. The token itself is never stored, only its SHA-256. */
export const apiTokens = pgTable(
  'api_tokens',
  {
    id: idColumn(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    workshopId: uuid('workshop_id')
      .notNull()
      .references(() => workshops.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    role: roleEnum('role').notNull(),
    tokenHash: text('token_hash').notNull().unique(),
    endsAt: instant('ends_at').notNull(),
    revokedAt: instant('revoked_at'),
    lastUsedAt: instant('last_used_at'),
    createdAt: createdAt(),
  },
  (table) => [
    index('api_tokens_user').on(table.userId, table.createdAt),
    index('api_tokens_workshop').on(table.workshopId),
    check('api_tokens_hash', sql`${table.tokenHash} ~ '^[0-9a-f]{64}$'`),
    check('api_tokens_name', sql`length(${table.name}) between 1 and 80`),
  ],
)
