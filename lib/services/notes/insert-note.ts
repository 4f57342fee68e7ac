import type { Transaction } from '@/db/client'
import { nextNumber } from '@/db/queries/notes'
import { notePosts, notes } from '@/db/schema'
import type { NoteKind } from '@/lib/contracts/notes'
import type { Anchor } from '@/scene/model/anchor'
import type { StillDrawing } from '@/scene/model/still-drawing'
import { auditNote } from './record'
import type { Mention } from './stored'

/** A person of the workshop, or a guest by the link they came through. */
export type NoteWriter = { authorId: string } | { guestName: string; linkId: string }

interface NewNote {
  by: NoteWriter
  anchor: Anchor
  /** The pinned part in words. */
  part: string
  kind: NoteKind
  heading: string
  words: string
  drawing: StillDrawing | null
  mentions: Mention[]
}

/** The next note of a scene that is held, with its first post. */
export async function insertNote(
  tx: Transaction,
  scene: { id: string; workshopId: string },
  { by, anchor, part, kind, heading, words, drawing, mentions }: NewNote,
) {
  const number = await nextNumber(tx, scene.id)
  const [note] = await tx
    .insert(notes)
    .values({
      ...by,
      ...{ sceneId: scene.id, number, version: anchor.version, kind, heading },
      ...{ anchor, partId: anchor.partId, part },
    })
    .returning()
  const { authorId, guestName } = note
  const [post] = await tx
    .insert(notePosts)
    .values({ noteId: note.id, number: 1, authorId, guestName, words, drawing, mentions })
    .returning()
  await auditNote(tx, {
    actorId: authorId,
    workshopId: scene.workshopId,
    operation: 'note.write',
    note,
    after: { scene: scene.id, number, version: anchor.version, kind, part: anchor.partId, guest: guestName },
  })
  return { note, post }
}
