import { index, pgEnum, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core'
import { createdAt } from './columns'
import { users } from './users'
import { workshops } from './workshops'

export const roleEnum = pgEnum('role', ['owner', 'designer', 'sales', 'service', 'reviewer'])

export const memberships = pgTable(
  'memberships',
  {
    workshopId: uuid('workshop_id')
      .notNull()
      .references(() => workshops.id, { onDelete: 'cascade' }),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    role: roleEnum('role').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    primaryKey({ columns: [table.workshopId, table.userId] }),
    index('memberships_user').on(table.userId),
  ],
)
