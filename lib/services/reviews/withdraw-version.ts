import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import type { Review } from '@/lib/contracts/verdicts'
import { endRequest, moveVersion, refuseHeld } from './move-version'
import { reviewAnswer } from './review-answer'
import { reviewGround } from './review-ground'
import { holdVersion, withVersion } from './review-scene'

/** For good, approved or not. The approval stays written; an older approved version does not come back by this. */
export async function withdrawVersion(
  person: Person | null,
  id: string,
  number: number,
  reason: string,
): Promise<{ review: Review }> {
  return write(async (tx) => {
    const scene = await holdVersion(tx, person, 'version.withdraw', id, number)
    const maker = person as Person
    refuseHeld('withdraw', number, await reviewGround(tx, scene, maker.id))
    await endRequest(tx, id, number, 'withdrawn')
    await moveVersion(tx, scene, { act: 'withdraw', actorId: maker.id, reason })
    return { review: await reviewAnswer(tx, maker, await withVersion(tx, scene, number)) }
  })
}
