import { foreignKey, integer, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core'
import { instant } from './columns'
import { sceneVersions } from './scene-versions'
import { users } from './users'

/** When somebody of the workshop had a version before them for the first and the last time. */
export const versionOpenings = pgTable(
  'version_openings',
  {
    sceneId: uuid('scene_id').notNull(),
    version: integer('version').notNull(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    firstAt: instant('first_at').notNull().defaultNow(),
    lastAt: instant('last_at').notNull().defaultNow(),
  },
  (table) => [
    primaryKey({ columns: [table.sceneId, table.version, table.userId] }),
    foreignKey({
      name: 'version_openings_version',
      columns: [table.sceneId, table.version],
      foreignColumns: [sceneVersions.sceneId, sceneVersions.number],
    }),
  ],
)
