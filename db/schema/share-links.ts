import { sql } from 'drizzle-orm'
import { check, foreignKey, index, integer, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { sceneVersions } from './scene-versions'
import { scenes } from './scenes'
import { users } from './users'

export const linkKindEnum = pgEnum('link_kind', ['look', 'note', 'decide'])

/** The token itself is never stored, only its SHA-256. Without a version the link follows the scene's head. */
export const shareLinks = pgTable(
  'share_links',
  {
    id: idColumn(),
    sceneId: uuid('scene_id')
      .notNull()
      .references(() => scenes.id),
    tokenHash: text('token_hash').notNull().unique(),
    label: text('label').notNull(),
    kind: linkKindEnum('kind').notNull().default('look'),
    version: integer('version'),
    /** Without one, whoever has the address is let in. */
    passwordHash: text('password_hash'),
    /** Sites that may show the link in a frame; none unless named. */
    frameOrigins: text('frame_origins')
      .array()
      .notNull()
      .default(sql`'{}'::text[]`),
    endsAt: instant('ends_at'),
    revokedAt: instant('revoked_at'),
    opened: integer('opened').notNull().default(0),
    lastOpenedAt: instant('last_opened_at'),
    createdBy: uuid('created_by')
      .notNull()
      .references(() => users.id),
    createdAt: createdAt(),
  },
  (table) => [
    index('share_links_scene').on(table.sceneId, table.createdAt),
    foreignKey({
      name: 'share_links_version',
      columns: [table.sceneId, table.version],
      foreignColumns: [sceneVersions.sceneId, sceneVersions.number],
    }),
    check('share_links_hash', sql`${table.tokenHash} ~ '^[0-9a-f]{64}$'`),
    check('share_links_frames', sql`cardinality(${table.frameOrigins}) <= 20`),
    check('share_links_label', sql`length(${table.label}) <= 120`),
  ],
)
