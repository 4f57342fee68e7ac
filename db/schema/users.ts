import { sql } from 'drizzle-orm'
import { check, pgTable, text } from 'drizzle-orm/pg-core'
import { createdAt, idColumn } from './columns'

export const users = pgTable(
  'users',
  {
    id: idColumn(),
    email: text('email').notNull().unique(),
    name: text('name').notNull(),
    passwordHash: text('password_hash').notNull(),
    createdAt: createdAt(),
  },
  (table) => [check('users_email_lower', sql`${table.email} = lower(${table.email})`)],
)
