import { sql } from 'drizzle-orm'
import { check, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn } from './columns'
import { workshops } from './workshops'

export const users = pgTable(
  'users',
  {
    id: idColumn(),
    email: text('email').notNull().unique(),
    name: text('name').notNull(),
    passwordHash: text('password_hash').notNull(),
    /** The workshop whose things are before them, on every machine; without one, the oldest of theirs. */
    workshopId: uuid('workshop_id').references(() => workshops.id, { onDelete: 'set null' }),
    createdAt: createdAt(),
  },
  (table) => [check('users_email_lower', sql`${table.email} = lower(${table.email})`)],
)
