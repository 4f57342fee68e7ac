import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import { editMinutes, type changeNote as contract, type Note } from '@/lib/contracts/notes'
import type { BodyOf } from '@/lib/contracts/operation'
import { noteAtHand, notYours, overtaken, type LockedNote } from './note-at-hand'
import { openedNote } from './opened-notes'
import { editableUntil, maySettle, type Reader } from './reader'
import { auditNote, changeHeld, recordEvent } from './record'

/** Another kind, by its author or a judge; another heading, by its author while it is new. */
export async function changeNote(
  person: Person | null,
  sceneId: string,
  number: number,
  { revision, kind, heading }: BodyOf<typeof contract>,
): Promise<Note> {
  return write(async (tx) => {
    const { scene, note, reader } = await noteAtHand(tx, person, sceneId, number, 'note.write')
    const newKind = kind !== undefined && kind !== note.kind
    const newHeading = heading !== undefined && heading !== note.heading
    judge(note, reader, newKind, newHeading)
    const answer = () => openedNote(tx, reader, sceneId, number, scene.headVersion)
    if (note.revision !== revision) {
      throw overtaken(`Note ${number} has changed since you opened it.`, { note: await answer() })
    }
    if (!newKind && !newHeading) return answer()
    await changeHeld(tx, note, { ...(newKind && { kind }), ...(newHeading && { heading }) })
    if (newKind) await recordEvent(tx, note, reader, { event: 'kind-changed', from: note.kind, to: kind })
    await auditNote(tx, {
      actorId: reader.person.id,
      workshopId: scene.workshopId,
      operation: 'note.change',
      note,
      before: { kind: note.kind, heading: note.heading },
      after: { kind: kind ?? note.kind, heading: heading ?? note.heading },
    })
    return answer()
  })
}

function judge(note: LockedNote, reader: Reader, newKind: boolean, newHeading: boolean) {
  if (newKind && !maySettle(reader, note))
    throw notYours('The kind of a note is its author’s or a judge’s to change.')
  if (newHeading && !editableUntil(reader, note)) {
    throw notYours(`A heading is its author’s to change, within ${editMinutes} minutes.`)
  }
}
