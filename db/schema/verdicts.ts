import { sql } from 'drizzle-orm'
import { check, foreignKey, index, integer, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { verdictWords } from '@/lib/review/version-states'
import { createdAt, idColumn } from './columns'
import { reviewRequests } from './review-requests'
import { sceneVersions } from './scene-versions'
import { shareLinks } from './share-links'
import { users } from './users'

export const verdictWordEnum = pgEnum('verdict_word', verdictWords)

/** Append-only (a trigger of the hand-made migration): a person's or a guest's word on a version, and what it was on. */
export const verdicts = pgTable(
  'verdicts',
  {
    id: idColumn(),
    sceneId: uuid('scene_id').notNull(),
    version: integer('version').notNull(),
    requestId: uuid('request_id').references(() => reviewRequests.id),
    userId: uuid('user_id').references(() => users.id),
    linkId: uuid('link_id').references(() => shareLinks.id),
    guestName: text('guest_name'),
    word: verdictWordEnum('word').notNull(),
    sentence: text('sentence').notNull(),
    /** SHA-256 of the canonical text of scene, version and document. */
    hash: text('hash').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    foreignKey({
      name: 'verdicts_version',
      columns: [table.sceneId, table.version],
      foreignColumns: [sceneVersions.sceneId, sceneVersions.number],
    }),
    index('verdicts_version_time').on(table.sceneId, table.version, table.createdAt),
    index('verdicts_user').on(table.userId, table.createdAt, table.id),
    index('verdicts_link').on(table.linkId, table.version),
    check('verdicts_one_giver', sql`(${table.userId} is null) <> (${table.linkId} is null)`),
    check('verdicts_guest_named', sql`(${table.linkId} is null) = (${table.guestName} is null)`),
    check('verdicts_guest_name', sql`length(${table.guestName}) between 1 and 80`),
    check('verdicts_sentence', sql`length(${table.sentence}) <= 500`),
    check('verdicts_hash', sql`${table.hash} ~ '^[0-9a-f]{64}$'`),
  ],
)
