import { index, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core'
import { reviewRequests } from './review-requests'
import { users } from './users'

/** Who is asked. */
export const reviewReviewers = pgTable(
  'review_reviewers',
  {
    requestId: uuid('request_id')
      .notNull()
      .references(() => reviewRequests.id, { onDelete: 'cascade' }),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
  },
  (table) => [
    primaryKey({ columns: [table.requestId, table.userId] }),
    index('review_reviewers_user').on(table.userId, table.requestId),
  ],
)
