import { foreignKey, integer, pgEnum, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core'
import { bytes, createdAt } from './columns'
import { sceneVersions } from './scene-versions'

export const themeEnum = pgEnum('theme', ['light', 'dark'])

/** The thumbnail of a version, drawn in the background: a version never changes, nor does its picture. */
export const pictures = pgTable(
  'pictures',
  {
    sceneId: uuid('scene_id').notNull(),
    version: integer('version').notNull(),
    theme: themeEnum('theme').notNull(),
    png: bytes('png').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    primaryKey({ columns: [table.sceneId, table.version, table.theme] }),
    foreignKey({
      name: 'pictures_version',
      columns: [table.sceneId, table.version],
      foreignColumns: [sceneVersions.sceneId, sceneVersions.number],
    }),
  ],
)
