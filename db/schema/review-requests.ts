import { sql } from 'drizzle-orm'
import {
  check,
  date,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { sceneVersions } from './scene-versions'
import { users } from './users'

/** `answered` by a verdict, `called-off` by who asked, `replaced` by asking again, or the version went out of the way. */
export const reviewEndEnum = pgEnum('review_end', [
  'answered',
  'called-off',
  'replaced',
  'overtaken',
  'withdrawn',
])

/** Somebody asked others to judge a version; of one version one at a time is open. */
export const reviewRequests = pgTable(
  'review_requests',
  {
    id: idColumn(),
    sceneId: uuid('scene_id').notNull(),
    version: integer('version').notNull(),
    askedBy: uuid('asked_by')
      .notNull()
      .references(() => users.id),
    /** A day without an hour: the same wherever it is read. */
    due: date('due').notNull(),
    message: text('message').notNull(),
    checklist: jsonb('checklist').$type<unknown>().notNull(),
    endedAs: reviewEndEnum('ended_as'),
    endedAt: instant('ended_at'),
    createdAt: createdAt(),
  },
  (table) => [
    foreignKey({
      name: 'review_requests_version',
      columns: [table.sceneId, table.version],
      foreignColumns: [sceneVersions.sceneId, sceneVersions.number],
    }),
    index('review_requests_scene').on(table.sceneId, table.version, table.createdAt),
    index('review_requests_asker').on(table.askedBy, table.createdAt, table.id),
    uniqueIndex('review_requests_one_open')
      .on(table.sceneId, table.version)
      .where(sql`${table.endedAt} is null`),
    check('review_requests_end', sql`(${table.endedAt} is null) = (${table.endedAs} is null)`),
    check('review_requests_message', sql`length(${table.message}) <= 2000`),
    check('review_requests_checklist', sql`jsonb_typeof(${table.checklist}) = 'array'`),
  ],
)
