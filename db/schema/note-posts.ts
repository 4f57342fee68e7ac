import { sql } from 'drizzle-orm'
import { check, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { notes } from './notes'
import { users } from './users'

/** The thread of a note, from post 1, which is the note's own words. A deleted one stays, emptied. */
export const notePosts = pgTable(
  'note_posts',
  {
    id: idColumn(),
    noteId: uuid('note_id')
      .notNull()
      .references(() => notes.id),
    number: integer('number').notNull(),
    authorId: uuid('author_id').references(() => users.id),
    guestName: text('guest_name'),
    words: text('words').notNull(),
    /** [{ userId, name at the time }] */
    mentions: jsonb('mentions').$type<unknown>().notNull().default([]),
    drawing: jsonb('drawing').$type<unknown>(),
    revision: integer('revision').notNull().default(1),
    createdAt: createdAt(),
    editedAt: instant('edited_at'),
    deletedAt: instant('deleted_at'),
  },
  (table) => [
    unique('note_posts_number').on(table.noteId, table.number),
    check('note_posts_number_positive', sql`${table.number} >= 1`),
    check('note_posts_words', sql`length(${table.words}) <= 4000`),
    check(
      'note_posts_writer',
      sql`(${table.authorId} is null) = (${table.guestName} is not null)
        and length(${table.guestName}) between 1 and 80`,
    ),
    check(
      'note_posts_emptied',
      sql`${table.deletedAt} is null or (${table.words} = '' and ${table.drawing} is null)`,
    ),
  ],
)
