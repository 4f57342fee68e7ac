import { sql } from 'drizzle-orm'
import { check, integer, pgEnum, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { checklistAnswers as answers } from '@/lib/review/version-states'
import { instant } from './columns'
import { reviewRequests } from './review-requests'
import { users } from './users'

export const checklistAnswerEnum = pgEnum('checklist_answer', answers)

/** What one person answered to one item of a review's checklist. */
export const checklistAnswers = pgTable(
  'checklist_answers',
  {
    requestId: uuid('request_id')
      .notNull()
      .references(() => reviewRequests.id, { onDelete: 'cascade' }),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    /** Its place in the request's checklist, from 0. */
    item: integer('item').notNull(),
    answer: checklistAnswerEnum('answer').notNull(),
    words: text('words').notNull(),
    answeredAt: instant('answered_at').notNull().defaultNow(),
  },
  (table) => [
    primaryKey({ columns: [table.requestId, table.userId, table.item] }),
    check('checklist_answers_item', sql`${table.item} >= 0`),
    check('checklist_answers_words', sql`length(${table.words}) <= 500`),
    check('checklist_answers_no', sql`${table.answer} <> 'no' or ${table.words} <> ''`),
  ],
)
