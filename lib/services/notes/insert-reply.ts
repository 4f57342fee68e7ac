import { eq } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { notePosts, notes } from '@/db/schema'
import { Problem } from '@/lib/errors/problem'
import type { StillDrawing } from '@/scene/model/still-drawing'
import type { LockedNote } from './note-at-hand'
import { auditNote } from './record'
import type { Mention } from './stored'

const mostPosts = 500

interface Reply {
  by: { authorId: string } | { guestName: string }
  words: string
  drawing: StillDrawing | null
  mentions: Mention[]
}

/** The next post of a held note. */
export async function insertReply(
  tx: Transaction,
  scene: { id: string; workshopId: string },
  note: LockedNote,
  { by, ...says }: Reply,
) {
  if (note.posts >= mostPosts) {
    throw new Problem(
      'refused',
      `A thread ends at ${mostPosts} posts.`,
      'Make another note that names this one.',
    )
  }
  const number = note.posts + 1
  const [post] = await tx
    .insert(notePosts)
    .values({ noteId: note.id, number, ...by, ...says })
    .returning()
  await tx.update(notes).set({ posts: number, lastPostAt: post.createdAt }).where(eq(notes.id, note.id))
  await auditNote(tx, {
    actorId: post.authorId,
    workshopId: scene.workshopId,
    operation: 'note.reply',
    note,
    after: { scene: scene.id, number: note.number, post: number, guest: post.guestName },
  })
  return post
}
