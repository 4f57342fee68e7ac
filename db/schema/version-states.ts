import { sql } from 'drizzle-orm'
import { check, foreignKey, integer, pgEnum, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { versionStates as states } from '@/lib/review/version-states'
import { instant } from './columns'
import { sceneVersions } from './scene-versions'
import { users } from './users'

export const versionStateEnum = pgEnum('version_state', states)

/** What a version is to those who judge it; one without a row is a draft. */
export const versionStates = pgTable(
  'version_states',
  {
    sceneId: uuid('scene_id').notNull(),
    number: integer('number').notNull(),
    state: versionStateEnum('state').notNull(),
    /** Null when a guest's or another version's doing brought it here. */
    changedBy: uuid('changed_by').references(() => users.id),
    changedAt: instant('changed_at').notNull().defaultNow(),
    /** Why it was withdrawn. */
    reason: text('reason').notNull().default(''),
  },
  (table) => [
    primaryKey({ columns: [table.sceneId, table.number] }),
    foreignKey({
      name: 'version_states_version',
      columns: [table.sceneId, table.number],
      foreignColumns: [sceneVersions.sceneId, sceneVersions.number],
    }),
    check('version_states_reason', sql`length(${table.reason}) <= 500`),
  ],
)
