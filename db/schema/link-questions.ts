import { sql } from 'drizzle-orm'
import { check, doublePrecision, index, integer, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn } from './columns'
import { shareLinks } from './share-links'

/** What somebody asked on a link's page, and what they had before them then. */
export const linkQuestions = pgTable(
  'link_questions',
  {
    id: idColumn(),
    linkId: uuid('link_id')
      .notNull()
      .references(() => shareLinks.id, { onDelete: 'cascade' }),
    version: integer('version').notNull(),
    name: text('name').notNull(),
    email: text('email').notNull(),
    question: text('question').notNull(),
    angleDeg: doublePrecision('angle_deg'),
    view: text('view'),
    createdAt: createdAt(),
  },
  (table) => [
    index('link_questions_link').on(table.linkId, table.createdAt, table.id),
    index('link_questions_email').on(table.email, table.createdAt),
    check('link_questions_name', sql`length(${table.name}) between 1 and 120`),
    check('link_questions_question', sql`length(${table.question}) between 1 and 2000`),
    check('link_questions_view', sql`length(${table.view}) <= 120`),
  ],
)
