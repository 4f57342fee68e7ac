import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import type { Note, replyToNote as contract } from '@/lib/contracts/notes'
import type { BodyOf } from '@/lib/contracts/operation'
import { notePlace, once, requestHash } from '../idempotency'
import { insertReply } from './insert-reply'
import { mentioned, tellMentioned } from './mentioned'
import { noteAtHand } from './note-at-hand'
import { openedNote } from './opened-notes'

/** The note is held: of two replies at once each gets its own place in the thread. */
export const replyToNote = (
  person: Person | null,
  sceneId: string,
  number: number,
  body: BodyOf<typeof contract>,
  key?: string,
): Promise<Note> =>
  write(async (tx) => {
    const { scene, note, reader } = await noteAtHand(tx, person, sceneId, number, 'note.write')
    const authorId = reader.person.id
    await once(tx, authorId, key, requestHash('reply', sceneId, number, body), notePlace, async () => {
      const mentions = await mentioned(tx, scene.workshopId, body.mentions)
      const post = await insertReply(tx, scene, note, { ...body, by: { authorId }, mentions })
      await tellMentioned(tx, mentions, { sceneId, noteId: note.id, postId: post.id, authorId })
      return { number }
    })
    return openedNote(tx, reader, sceneId, number, scene.headVersion)
  })
