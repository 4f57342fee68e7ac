import { sql } from 'drizzle-orm'
import {
  check,
  doublePrecision,
  foreignKey,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uuid,
} from 'drizzle-orm/pg-core'
import { createdAt } from './columns'
import { scenes } from './scenes'
import { users } from './users'

/** Immutable (a trigger of the hand-made migration), numbered from 1 in each scene. */
export const sceneVersions = pgTable(
  'scene_versions',
  {
    sceneId: uuid('scene_id')
      .notNull()
      .references(() => scenes.id),
    number: integer('number').notNull(),
    parent: integer('parent'),
    document: jsonb('document').$type<unknown>().notNull(),
    message: text('message').notNull(),
    authorId: uuid('author_id')
      .notNull()
      .references(() => users.id),
    /** For the list, recomputed from the document when it is saved. */
    cylinderCount: integer('cylinder_count').notNull(),
    displacementCc: doublePrecision('displacement_cc').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    primaryKey({ columns: [table.sceneId, table.number] }),
    foreignKey({
      name: 'scene_versions_parent',
      columns: [table.sceneId, table.parent],
      foreignColumns: [table.sceneId, table.number],
    }),
    check('scene_versions_number', sql`${table.number} >= 1`),
    check('scene_versions_parent_older', sql`${table.parent} < ${table.number}`),
    check('scene_versions_message', sql`length(${table.message}) <= 500`),
  ],
)
