import { sql, type SQLWrapper } from 'drizzle-orm'
import { check, index, integer, pgTable, text, uuid, type AnyPgColumn } from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { users } from './users'
import { workshops } from './workshops'

/** As people sort and search: without regard to case, in any script, whatever the database was set up with. */
export const folded = (title: SQLWrapper) => sql`lower(${title} collate "und-x-icu")`

/**
 * What changes about a scene: its title, its place in the list, which version is its head. What it shows is in
 * scene_versions; that the head exists there is a deferred foreign key of the hand-made migration.
 */
export const scenes = pgTable(
  'scenes',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id')
      .notNull()
      .references(() => workshops.id),
    title: text('title').notNull(),
    headVersion: integer('head_version').notNull(),
    duplicatedFrom: uuid('duplicated_from').references((): AnyPgColumn => scenes.id),
    duplicatedFromVersion: integer('duplicated_from_version'),
    archivedAt: instant('archived_at'),
    createdBy: uuid('created_by')
      .notNull()
      .references(() => users.id),
    createdAt: createdAt(),
    updatedAt: instant('updated_at').notNull().defaultNow(),
  },
  (table) => [
    index('scenes_by_change').on(table.workshopId, table.updatedAt, table.id),
    index('scenes_by_creation').on(table.workshopId, table.createdAt, table.id),
    index('scenes_by_title').on(table.workshopId, folded(table.title), table.id),
    check('scenes_title', sql`length(${table.title}) between 1 and 200`),
    check('scenes_head_version', sql`${table.headVersion} >= 1`),
    check(
      'scenes_lineage',
      sql`(${table.duplicatedFrom} is null) = (${table.duplicatedFromVersion} is null)`,
    ),
  ],
)
