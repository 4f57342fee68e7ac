import { eq, sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { postByNumber } from '@/db/queries/notes'
import { notePosts } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { editMinutes, type editPost as contract, type Note } from '@/lib/contracts/notes'
import type { BodyOf } from '@/lib/contracts/operation'
import { notFound, Problem } from '@/lib/errors/problem'
import { mentioned, tellMentioned } from './mentioned'
import { noteAtHand, overtaken } from './note-at-hand'
import { openedNote } from './opened-notes'
import { editableUntil, isOwn } from './reader'
import { auditNote } from './record'
import { storedMentions } from './stored'

interface Place {
  sceneId: string
  number: number
  post: number
}

/** What it said before is not kept: it is marked as edited, and only somebody newly named is told. */
export async function editPost(
  person: Person | null,
  { sceneId, number, post: postNumber }: Place,
  { revision, words, mentions: named, drawing }: BodyOf<typeof contract>,
): Promise<Note> {
  return write(async (tx) => {
    const { scene, note, reader } = await noteAtHand(tx, person, sceneId, number, 'note.write')
    const post = await postByNumber(tx, note.id, postNumber)
    if (!post || post.deletedAt) throw notFound('post')
    if (!isOwn(reader, post)) {
      throw new Problem('not-allowed', 'Only who wrote a post may change it.', 'Reply to it instead.')
    }
    if (!editableUntil(reader, post)) {
      throw new Problem(
        'not-allowed',
        `A post can be changed for ${editMinutes} minutes after it was written.`,
        'Reply with what has changed.',
      )
    }
    if (post.revision !== revision) {
      throw overtaken('This post was changed meanwhile, in another window.', {
        now: { words: post.words, revision: post.revision },
        yours: { words },
      })
    }
    const mentions = await mentioned(tx, scene.workshopId, named)
    const told = storedMentions(post.mentions).map(({ userId }) => userId)
    await tx
      .update(notePosts)
      .set({
        ...{ words, mentions },
        ...(drawing !== undefined && { drawing }),
        editedAt: reader.now,
        revision: sql`${notePosts.revision} + 1`,
      })
      .where(eq(notePosts.id, post.id))
    await tellMentioned(
      tx,
      mentions.filter(({ userId }) => !told.includes(userId)),
      { sceneId, noteId: note.id, postId: post.id, authorId: reader.person.id },
    )
    await auditNote(tx, {
      actorId: reader.person.id,
      workshopId: scene.workshopId,
      operation: 'note.edit',
      note,
      before: { post: postNumber, revision },
      after: { post: postNumber, revision: revision + 1 },
    })
    return openedNote(tx, reader, sceneId, number, scene.headVersion)
  })
}
