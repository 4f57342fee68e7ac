import { integer, jsonb, pgTable, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { scenes } from './scenes'
import { users } from './users'

/** Work not yet saved as a version: one a person and scene, and one a person for a scene not saved at all. */
export const sceneDrafts = pgTable(
  'scene_drafts',
  {
    id: idColumn(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    sceneId: uuid('scene_id').references(() => scenes.id, { onDelete: 'cascade' }),
    baseVersion: integer('base_version'),
    document: jsonb('document').$type<unknown>().notNull(),
    createdAt: createdAt(),
    updatedAt: instant('updated_at').notNull().defaultNow(),
  },
  (table) => [unique('scene_drafts_one').on(table.userId, table.sceneId).nullsNotDistinct()],
)
