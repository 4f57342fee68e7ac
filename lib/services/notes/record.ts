import { eq, sql } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { noteEvents, notes } from '@/db/schema'
import { audit } from '../audit'
import type { LockedNote } from './note-at-hand'
import type { Reader } from './reader'
import type { StoredEvent } from './stored'

/** Changes a held note; its revision goes up. */
export async function changeHeld(
  tx: Transaction,
  note: LockedNote,
  values: Partial<typeof notes.$inferInsert>,
): Promise<void> {
  await tx
    .update(notes)
    .set({ ...values, revision: sql`${notes.revision} + 1` })
    .where(eq(notes.id, note.id))
}

/** What became of a note, for its history. */
export async function recordEvent(
  tx: Transaction,
  note: LockedNote,
  reader: Reader,
  what: StoredEvent,
): Promise<void> {
  await tx.insert(noteEvents).values({ noteId: note.id, actorId: reader.person.id, what })
}

interface NoteAudit {
  /** Null: a guest. */
  actorId: string | null
  workshopId: string
  operation: `note.${string}`
  note: { id: string }
  before?: unknown
  after?: unknown
}

export const auditNote = (tx: Transaction, { note, ...row }: NoteAudit) =>
  audit(tx, { ...row, subject: `note:${note.id}` })
