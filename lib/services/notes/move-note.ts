import { read, write } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { moveNote as contract, Note } from '@/lib/contracts/notes'
import type { BodyOf } from '@/lib/contracts/operation'
import { judgedAnchor } from './judged-anchor'
import { noteAtHand, overtaken } from './note-at-hand'
import { openedNote } from './opened-notes'
import { auditNote, changeHeld, recordEvent } from './record'
import { storedAnchor } from './stored'
import { versionsOf } from './versions-of'

/** Pins a note again; the version it was made on stays. */
export async function moveNote(
  person: Person | null,
  sceneId: string,
  number: number,
  { revision, anchor }: BodyOf<typeof contract>,
): Promise<Note> {
  const pinnedIn = await read(async (tx) => {
    authorise(person, 'note.write', await sceneById(tx, sceneId))
    return versionsOf(tx, sceneId, [anchor.version])
  })
  const part = judgedAnchor(anchor, pinnedIn.get(anchor.version))
  return write(async (tx) => {
    const { scene, note, reader } = await noteAtHand(tx, person, sceneId, number, 'note.write')
    const answer = () => openedNote(tx, reader, sceneId, number, scene.headVersion)
    if (note.revision !== revision) {
      throw overtaken(`Note ${number} has changed since you opened it.`, { note: await answer() })
    }
    const from = storedAnchor(note.anchor)
    await changeHeld(tx, note, { anchor, partId: anchor.partId, part })
    await recordEvent(tx, note, reader, { event: 'moved', from, to: anchor })
    await auditNote(tx, {
      actorId: reader.person.id,
      workshopId: scene.workshopId,
      operation: 'note.move',
      note,
      before: { version: from.version, part: from.partId, angleDeg: from.angleDeg },
      after: { version: anchor.version, part: anchor.partId, angleDeg: anchor.angleDeg },
    })
    return answer()
  })
}
