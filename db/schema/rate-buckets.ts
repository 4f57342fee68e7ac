import { boolean, doublePrecision, index, pgTable, text } from 'drizzle-orm/pg-core'
import { instant } from './columns'

/** How often something was tried lately, counted over all servers. Unlogged (a hand-made migration): nothing of it outlives a crash. */
export const rateBuckets = pgTable(
  'rate_buckets',
  {
    name: text('name').primaryKey(),
    tokens: doublePrecision('tokens').notNull(),
    /** Whether the last request got one. */
    taken: boolean('taken').notNull(),
    at: instant('at').notNull(),
  },
  (table) => [index('rate_buckets_age').on(table.at)],
)
