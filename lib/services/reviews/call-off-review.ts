import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import type { Review } from '@/lib/contracts/verdicts'
import { endRequest, moveVersion, refuseHeld } from './move-version'
import { reviewAnswer } from './review-answer'
import { reviewGround } from './review-ground'
import { holdVersion, withVersion } from './review-scene'

export async function callOffReview(
  person: Person | null,
  id: string,
  number: number,
): Promise<{ review: Review }> {
  return write(async (tx) => {
    const scene = await holdVersion(tx, person, 'review.ask', id, number)
    const asker = person as Person
    refuseHeld('call-off', number, await reviewGround(tx, scene, asker.id))
    await endRequest(tx, id, number, 'called-off')
    await moveVersion(tx, scene, { act: 'call-off', actorId: asker.id })
    return { review: await reviewAnswer(tx, asker, await withVersion(tx, scene, number)) }
  })
}
