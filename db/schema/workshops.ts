import { sql } from 'drizzle-orm'
import { check, pgTable, text } from 'drizzle-orm/pg-core'
import { createdAt, idColumn } from './columns'

export const workshops = pgTable(
  'workshops',
  {
    id: idColumn(),
    name: text('name').notNull(),
    createdAt: createdAt(),
  },
  (table) => [check('workshops_name', sql`length(${table.name}) between 1 and 120`)],
)
