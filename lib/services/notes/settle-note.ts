import { write, type Transaction } from '@/db/client'
import { noteByNumber } from '@/db/queries/notes'
import type { Person } from '@/lib/auth/access'
import type { Note, Settlement, settleNote as contract } from '@/lib/contracts/notes'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { noteAtHand, notYours, overtaken, type LockedNote } from './note-at-hand'
import { openedNote } from './opened-notes'
import { maySettle } from './reader'
import { auditNote, changeHeld, recordEvent } from './record'
import { storedSettled } from './stored'

/** The note is held: of two who settle it at once the second is told who was first, and why. */
export async function settleNote(
  person: Person | null,
  sceneId: string,
  number: number,
  { settlement, words }: BodyOf<typeof contract>,
): Promise<Note> {
  return write(async (tx) => {
    const { scene, note, reader } = await noteAtHand(tx, person, sceneId, number, 'note.settle')
    if (!maySettle(reader, note)) throw notYours('A note is its author’s or a judge’s to settle.')
    const answer = () => openedNote(tx, reader, sceneId, number, scene.headVersion)
    if (note.state === 'settled') {
      const by = storedSettled(note.settled)?.by ?? 'Somebody'
      throw overtaken(`${by} has settled note ${number} already.`, { note: await answer() })
    }
    await checkSettlement(tx, note, settlement, scene.headVersion)
    const settled = { by: reader.person.name, at: reader.now.toISOString(), words, settlement }
    await changeHeld(tx, note, { state: 'settled', settled })
    await recordEvent(tx, note, reader, { event: 'settled', settlement, words })
    await auditNote(tx, {
      actorId: reader.person.id,
      workshopId: scene.workshopId,
      operation: 'note.settle',
      note,
      before: { state: 'open' },
      after: { state: 'settled', ...settlement },
    })
    return answer()
  })
}

async function checkSettlement(
  tx: Transaction,
  note: LockedNote,
  settlement: Settlement,
  headVersion: number,
): Promise<void> {
  if (settlement.reason === 'fixed') {
    const { version } = settlement
    if (version > note.version && version <= headVersion) return
    const message =
      version > headVersion
        ? `There is no version ${version} yet: the latest is ${headVersion}.`
        : `Note ${note.number} was made on version ${note.version}: version ${version} cannot have mended it.`
    const fix =
      headVersion > note.version
        ? `Give one from ${note.version + 1} to ${headVersion}.`
        : 'Save the version that mends it first.'
    throw refused([{ path: 'settlement.version', code: 'not-later', message, fix }])
  }
  if (settlement.reason === 'duplicate') {
    const { number } = settlement
    const other = number === note.number ? undefined : await noteByNumber(tx, note.sceneId, number)
    if (other) return
    const message =
      number === note.number ? 'A note is not a duplicate of itself.' : `This scene has no note ${number}.`
    const fix = 'Give the number of the note that says the same.'
    throw refused([{ path: 'settlement.number', code: 'unknown-note', message, fix }])
  }
}
