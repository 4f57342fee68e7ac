import type { Transaction } from '@/db/client'
import { lockNote } from '@/db/queries/notes'
import { sceneById, type SceneRow } from '@/db/queries/scenes'
import type { Operation, Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { notFound, Problem } from '@/lib/errors/problem'
import { readerOf, type Reader } from './reader'

export type LockedNote = NonNullable<Awaited<ReturnType<typeof lockNote>>>

interface AtHand {
  scene: SceneRow
  note: LockedNote
  reader: Reader
}

/** A note held for a change by somebody whose role lets it; what else it takes is the verb's to ask. */
export async function noteAtHand(
  tx: Transaction,
  person: Person | null,
  sceneId: string,
  number: number,
  operation: Operation,
): Promise<AtHand> {
  const scene = await sceneById(tx, sceneId)
  authorise(person, operation, scene)
  const note = await lockNote(tx, sceneId, number)
  if (!scene || !note) throw notFound('note')
  return { scene, note, reader: readerOf(person, scene.workshopId) }
}

export const notYours = (detail: string) =>
  new Problem('not-allowed', detail, 'Ask its author, an owner or a reviewer of the workshop.')

/** The change was made from a state that somebody has changed meanwhile. */
export const overtaken = (detail: string, members: Record<string, unknown>) =>
  new Problem('conflict', detail, 'Look at it as it is now, then decide again.', { members })
