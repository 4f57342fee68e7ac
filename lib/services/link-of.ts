import type { Transaction } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import { linkById } from '@/db/queries/share-links'
import type { Operation, Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { notFound } from '@/lib/errors/problem'

/** A link that this person may do this to, with its scene and the person. */
export async function linkOf(tx: Transaction, person: Person | null, operation: Operation, id: string) {
  const row = await linkById(tx, id)
  const scene = row && (await sceneById(tx, row.link.sceneId))
  authorise(person, operation, scene, 'link')
  if (!row || !scene) throw notFound('link')
  return { row, scene, person }
}
