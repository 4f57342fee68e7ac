import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import type { Note } from '@/lib/contracts/notes'
import { noteAtHand, notYours, overtaken } from './note-at-hand'
import { openedNote } from './opened-notes'
import { maySettle } from './reader'
import { auditNote, changeHeld, recordEvent } from './record'
import { storedSettled } from './stored'

/** Open again; what it was settled with stays in its history. */
export const reopenNote = (
  person: Person | null,
  sceneId: string,
  number: number,
  words: string,
): Promise<Note> =>
  write(async (tx) => {
    const { scene, note, reader } = await noteAtHand(tx, person, sceneId, number, 'note.settle')
    if (!maySettle(reader, note)) throw notYours('A note is its author’s or a judge’s to open again.')
    const answer = () => openedNote(tx, reader, sceneId, number, scene.headVersion)
    if (note.state === 'open') throw overtaken(`Note ${number} is open already.`, { note: await answer() })
    await changeHeld(tx, note, { state: 'open', settled: null })
    await recordEvent(tx, note, reader, { event: 'reopened', words })
    await auditNote(tx, {
      actorId: reader.person.id,
      workshopId: scene.workshopId,
      operation: 'note.reopen',
      note,
      before: { state: 'settled', ...storedSettled(note.settled)?.settlement },
      after: { state: 'open' },
    })
    return answer()
  })
