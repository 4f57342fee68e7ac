import { eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { postByNumber } from '@/db/queries/notes'
import { notePosts } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import type { Note } from '@/lib/contracts/notes'
import { notFound, Problem } from '@/lib/errors/problem'
import { noteAtHand } from './note-at-hand'
import { openedNote } from './opened-notes'
import { mayDelete } from './reader'
import { auditNote } from './record'

/** Emptied for good; that somebody wrote here, and when, stays. Twice changes nothing more. */
export const deletePost = (
  person: Person | null,
  sceneId: string,
  number: number,
  postNumber: number,
): Promise<Note> =>
  write(async (tx) => {
    const { scene, note, reader } = await noteAtHand(tx, person, sceneId, number, 'note.write')
    const post = await postByNumber(tx, note.id, postNumber)
    if (!post) throw notFound('post')
    if (!mayDelete(reader, post)) {
      throw new Problem(
        'not-allowed',
        'Only who wrote a post, or an owner of the workshop, may delete it.',
        'Reply to it, or ask an owner.',
      )
    }
    if (!post.deletedAt) {
      await tx
        .update(notePosts)
        .set({ words: '', mentions: [], drawing: null, deletedAt: reader.now })
        .where(eq(notePosts.id, post.id))
      await auditNote(tx, {
        actorId: reader.person.id,
        workshopId: scene.workshopId,
        operation: 'note.delete',
        note,
        before: { post: postNumber, author: post.authorId, guest: post.guestName },
      })
    }
    return openedNote(tx, reader, sceneId, number, scene.headVersion)
  })
