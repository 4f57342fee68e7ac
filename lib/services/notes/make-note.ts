import { read, write } from '@/db/client'
import { lockScene, sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { makeNote as contract, Note } from '@/lib/contracts/notes'
import type { BodyOf } from '@/lib/contracts/operation'
import { notePlace, once, requestHash } from '../idempotency'
import { insertNote } from './insert-note'
import { judgedAnchor } from './judged-anchor'
import { mentioned, tellMentioned } from './mentioned'
import { openedNote } from './opened-notes'
import { readerOf } from './reader'
import { versionsOf } from './versions-of'

export async function makeNote(
  person: Person | null,
  sceneId: string,
  body: BodyOf<typeof contract>,
  key?: string,
): Promise<Note> {
  const { anchor, mentions: named } = body
  // versions do not change: what is judged before the scene is held is true while it is
  const pinnedIn = await read(async (tx) => {
    authorise(person, 'note.write', await sceneById(tx, sceneId))
    return versionsOf(tx, sceneId, [anchor.version])
  })
  const part = judgedAnchor(anchor, pinnedIn.get(anchor.version))
  return write(async (tx) => {
    const scene = await lockScene(tx, sceneId)
    authorise(person, 'note.write', scene)
    const authorId = person.id
    const { number } = await once(
      tx,
      authorId,
      key,
      requestHash('note', sceneId, body),
      notePlace,
      async () => {
        const mentions = await mentioned(tx, scene.workshopId, named)
        const { note, post } = await insertNote(tx, scene, { ...body, by: { authorId }, part, mentions })
        await tellMentioned(tx, mentions, { sceneId, noteId: note.id, postId: post.id, authorId })
        return { number: note.number }
      },
    )
    return openedNote(tx, readerOf(person, scene.workshopId), sceneId, number, anchor.version)
  })
}
