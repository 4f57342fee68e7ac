import { sql } from 'drizzle-orm'
import {
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { sceneVersions } from './scene-versions'
import { scenes } from './scenes'
import { shareLinks } from './share-links'
import { users } from './users'

export const noteKindEnum = pgEnum('note_kind', ['error', 'question', 'suggestion', 'remark'])
export const noteStateEnum = pgEnum('note_state', ['open', 'settled'])

/** Written by a person or, through a link, by a guest. What it says is its first post. */
export const notes = pgTable(
  'notes',
  {
    id: idColumn(),
    sceneId: uuid('scene_id')
      .notNull()
      .references(() => scenes.id),
    /** In its scene, from 1 without gaps: given while the scene is held. */
    number: integer('number').notNull(),
    /** The version it was made on. */
    version: integer('version').notNull(),
    kind: noteKindEnum('kind').notNull(),
    state: noteStateEnum('state').notNull().default('open'),
    heading: text('heading').notNull(),
    authorId: uuid('author_id').references(() => users.id),
    guestName: text('guest_name'),
    linkId: uuid('link_id').references(() => shareLinks.id),
    /** Where it is pinned now, and the pinned part by id and in words. */
    anchor: jsonb('anchor').$type<unknown>().notNull(),
    partId: text('part_id').notNull(),
    part: text('part').notNull(),
    posts: integer('posts').notNull().default(1),
    lastPostAt: instant('last_post_at').notNull().defaultNow(),
    /** What it was settled with last: reason, words, by whom and when. Null while open. */
    settled: jsonb('settled').$type<unknown>(),
    revision: integer('revision').notNull().default(1),
    createdAt: createdAt(),
  },
  (table) => [
    unique('notes_number').on(table.sceneId, table.number),
    index('notes_link').on(table.linkId, table.number),
    index('notes_open_errors')
      .on(table.sceneId, table.version)
      .where(sql`kind = 'error' and state = 'open'`),
    foreignKey({
      name: 'notes_version',
      columns: [table.sceneId, table.version],
      foreignColumns: [sceneVersions.sceneId, sceneVersions.number],
    }),
    check('notes_positive', sql`${table.number} >= 1 and ${table.posts} >= 1 and ${table.revision} >= 1`),
    check('notes_heading', sql`length(${table.heading}) <= 120`),
    check('notes_settled', sql`(${table.state} = 'settled') = (${table.settled} is not null)`),
    check(
      'notes_writer',
      sql`(${table.authorId} is null) = (${table.guestName} is not null)
        and (${table.guestName} is null) = (${table.linkId} is null)
        and length(${table.guestName}) between 1 and 80`,
    ),
  ],
)
