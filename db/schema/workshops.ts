import { sql } from 'drizzle-orm'
import { boolean, check, integer, jsonb, pgTable, text } from 'drizzle-orm/pg-core'
import { createdAt, idColumn } from './columns'

/** What a review asks about unless it says otherwise. */
const standardChecklist = ['Phasing', 'Firing', 'Masses', 'Clearances', 'Units', 'Wording']

export const workshops = pgTable(
  'workshops',
  {
    id: idColumn(),
    name: text('name').notNull(),
    /** Nobody approves a version that they made themselves. */
    needsTwoPeople: boolean('needs_two_people').notNull().default(false),
    checklist: jsonb('checklist').$type<unknown>().notNull().default(standardChecklist),
    /** How long it is kept when and how a share link was opened. */
    openingsKeptDays: integer('openings_kept_days').notNull().default(90),
    createdAt: createdAt(),
  },
  (table) => [
    check('workshops_name', sql`length(${table.name}) between 1 and 120`),
    check('workshops_openings_kept', sql`${table.openingsKeptDays} between 1 and 730`),
    check('workshops_checklist', sql`jsonb_typeof(${table.checklist}) = 'array'`),
  ],
)
