import { read } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { Review } from '@/lib/contracts/verdicts'
import { notFound } from '@/lib/errors/problem'
import { reviewAnswer } from './review-answer'
import { withVersion } from './review-scene'

export async function readReview(
  person: Person | null,
  id: string,
  number: number,
): Promise<{ review: Review }> {
  return read(async (tx) => {
    const scene = await sceneById(tx, id)
    authorise(person, 'review.read', scene)
    if (!scene) throw notFound('scene')
    return { review: await reviewAnswer(tx, person, await withVersion(tx, scene, number)) }
  })
}
