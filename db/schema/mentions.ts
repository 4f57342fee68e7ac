import { sql } from 'drizzle-orm'
import { index, pgTable, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { notePosts } from './note-posts'
import { notes } from './notes'
import { scenes } from './scenes'
import { users } from './users'

/** Somebody named in a post of a note’s thread, until they have been told of it, or need not be. */
export const mentions = pgTable(
  'mentions',
  {
    id: idColumn(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    sceneId: uuid('scene_id')
      .notNull()
      .references(() => scenes.id, { onDelete: 'cascade' }),
    noteId: uuid('note_id')
      .notNull()
      .references(() => notes.id, { onDelete: 'cascade' }),
    postId: uuid('post_id')
      .notNull()
      .references(() => notePosts.id, { onDelete: 'cascade' }),
    toldAt: instant('told_at'),
    createdAt: createdAt(),
  },
  (table) => [
    unique('mentions_once').on(table.userId, table.postId),
    index('mentions_untold')
      .on(table.userId, table.createdAt)
      .where(sql`${table.toldAt} is null`),
  ],
)
