import type { Transaction } from '@/db/client'
import { eventsOf, noteByNumber, postsOf, type NoteRow } from '@/db/queries/notes'
import type { Note } from '@/lib/contracts/notes'
import { notFound } from '@/lib/errors/problem'
import { noteAnswer, type Seen } from './note-answers'
import type { Reader } from './reader'
import { storedAnchor } from './stored'
import { versionsOf } from './versions-of'

/** What is needed to say how each of these notes stands in a version. */
export async function seenIn(
  tx: Transaction,
  sceneId: string,
  version: number,
  rows: readonly NoteRow[],
): Promise<Seen> {
  const pinned = rows.map(({ note }) => storedAnchor(note.anchor).version)
  return { version, scenes: await versionsOf(tx, sceneId, [version, ...pinned]) }
}

/** Notes with their threads and events, three queries however many they are. */
export async function openedNotes(
  tx: Transaction,
  sceneId: string,
  version: number,
  rows: readonly NoteRow[],
  reader: Reader,
): Promise<Note[]> {
  if (rows.length === 0) return []
  const ids = rows.map(({ note }) => note.id)
  const seen = await seenIn(tx, sceneId, version, rows)
  const posts = byNote(await postsOf(tx, ids), ({ post }) => post.noteId)
  const events = byNote(await eventsOf(tx, ids), ({ event }) => event.noteId)
  return rows.map((row) =>
    noteAnswer(row, posts.get(row.note.id) ?? [], events.get(row.note.id) ?? [], reader, seen),
  )
}

function byNote<T>(rows: readonly T[], noteOf: (row: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>()
  for (const row of rows) {
    const group = groups.get(noteOf(row))
    if (group) group.push(row)
    else groups.set(noteOf(row), [row])
  }
  return groups
}

export async function openedNote(
  tx: Transaction,
  reader: Reader,
  sceneId: string,
  number: number,
  version: number,
): Promise<Note> {
  const row = await noteByNumber(tx, sceneId, number)
  if (!row) throw notFound('note')
  const [note] = await openedNotes(tx, sceneId, version, [row], reader)
  return note
}
