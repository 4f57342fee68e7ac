import { sql } from 'drizzle-orm'
import { check, index, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { roleEnum } from './memberships'
import { users } from './users'
import { workshops } from './workshops'

/** One at a time for an address and a workshop; sending it again gives it a new token and a new end. */
export const invitations = pgTable(
  'invitations',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id')
      .notNull()
      .references(() => workshops.id, { onDelete: 'cascade' }),
    email: text('email').notNull(),
    role: roleEnum('role').notNull(),
    tokenHash: text('token_hash').notNull().unique(),
    invitedBy: uuid('invited_by')
      .notNull()
      .references(() => users.id),
    sentAt: instant('sent_at').notNull(),
    endsAt: instant('ends_at').notNull(),
    acceptedAt: instant('accepted_at'),
    acceptedBy: uuid('accepted_by').references(() => users.id),
    withdrawnAt: instant('withdrawn_at'),
    createdAt: createdAt(),
  },
  (table) => [
    index('invitations_workshop').on(table.workshopId, table.createdAt),
    uniqueIndex('invitations_one')
      .on(table.workshopId, table.email)
      .where(sql`${table.acceptedAt} is null and ${table.withdrawnAt} is null`),
    check('invitations_email_lower', sql`${table.email} = lower(${table.email})`),
    check('invitations_hash', sql`${table.tokenHash} ~ '^[0-9a-f]{64}$'`),
    check('invitations_one_end', sql`${table.acceptedAt} is null or ${table.withdrawnAt} is null`),
    check('invitations_accepted', sql`(${table.acceptedAt} is null) = (${table.acceptedBy} is null)`),
  ],
)
