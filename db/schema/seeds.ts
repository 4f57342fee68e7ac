import { pgTable, text } from 'drizzle-orm/pg-core'
import { createdAt } from './columns'

/** A row for each set of demonstration data that has been put in, so that it is put in once. */
export const seeds = pgTable('seeds', { name: text('name').primaryKey(), createdAt: createdAt() })
