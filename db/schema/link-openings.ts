import { sql } from 'drizzle-orm'
import { check, index, integer, pgEnum, pgTable, uuid } from 'drizzle-orm/pg-core'
import { idColumn, instant } from './columns'
import { shareLinks } from './share-links'

export const deviceEnum = pgEnum('device', ['phone', 'tablet', 'desktop'])

const seconds = (name: string) => integer(name).notNull().default(0)

/** That somebody had a link's page before them: when, on what, what of it and for how long. No address, no place, no name. */
export const linkOpenings = pgTable(
  'link_openings',
  {
    id: idColumn(),
    linkId: uuid('link_id')
      .notNull()
      .references(() => shareLinks.id, { onDelete: 'cascade' }),
    version: integer('version').notNull(),
    device: deviceEnum('device').notNull(),
    openedAt: instant('opened_at').notNull().defaultNow(),
    drawingSeconds: seconds('drawing_seconds'),
    figuresSeconds: seconds('figures_seconds'),
    notesSeconds: seconds('notes_seconds'),
  },
  (table) => [
    index('link_openings_link').on(table.linkId, table.openedAt, table.id),
    index('link_openings_age').on(table.openedAt),
    check(
      'link_openings_seconds',
      sql`least(${table.drawingSeconds}, ${table.figuresSeconds}, ${table.notesSeconds}) >= 0`,
    ),
  ],
)
