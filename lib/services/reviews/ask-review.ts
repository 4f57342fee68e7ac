import { write, type Transaction } from '@/db/client'
import { newId } from '@/db/schema/columns'
import { peopleWith, reviewRules } from '@/db/queries/reviews'
import { reviewRequests, reviewReviewers } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { checklistSchema, type askReview as contract, type Review } from '@/lib/contracts/verdicts'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { once, requestHash, versionPlace } from '../idempotency'
import { postMail } from '../mail/post-mail'
import { endRequest, moveVersion, overtakeOlder, refuseHeld } from './move-version'
import { planReminders } from './plan-reminders'
import { judging, reviewAnswer } from './review-answer'
import { reviewGround } from './review-ground'
import { holdVersion, reviewUrl, withVersion, type HeldScene } from './review-scene'

type Asked = BodyOf<typeof contract>

/** Asks people for their verdict. A review that was open on this version or an older one ends with it. */
export async function askReview(
  person: Person | null,
  id: string,
  number: number,
  asked: Asked,
  key?: string,
): Promise<{ review: Review }> {
  return write(async (tx) => {
    const scene = await holdVersion(tx, person, 'review.ask', id, number)
    const asker = person as Person
    await once(tx, asker.id, key, requestHash('ask-review', id, number, asked), versionPlace, async () => {
      await ask(tx, asker, scene, asked)
      return { sceneId: id, version: number }
    })
    return { review: await reviewAnswer(tx, asker, await withVersion(tx, scene, number)) }
  })
}

async function ask(tx: Transaction, asker: Person, scene: HeldScene, asked: Asked) {
  const { number, authorId } = scene.version
  const ground = await reviewGround(tx, scene, asker.id)
  refuseHeld('ask', number, ground)
  const wanted = new Set(asked.reviewers)
  const reviewers = (await peopleWith(tx, scene.workshopId, judging)).filter(({ id }) => wanted.has(id))
  refuseStrangers(asked.reviewers, reviewers)
  if (ground.needsTwoPeople && reviewers.every(({ id }) => id === authorId)) {
    const message = 'This workshop wants approval by somebody else than the author.'
    throw refused([{ path: 'reviewers', code: 'own-version', message, fix: 'Name one more person.' }])
  }
  refusePast(asked.due)
  const rules = await reviewRules(tx, scene.workshopId)
  const checklist = asked.checklist ?? checklistSchema.parse(rules?.checklist ?? [])

  await endRequest(tx, scene.id, number, 'replaced')
  await overtakeOlder(tx, scene, asker.id, ['in-review'])
  const requestId = newId()
  const { due, message } = asked
  await tx.insert(reviewRequests).values({
    ...{ id: requestId, sceneId: scene.id, version: number, askedBy: asker.id },
    ...{ due, message, checklist },
  })
  await tx.insert(reviewReviewers).values(reviewers.map(({ id }) => ({ requestId, userId: id })))
  await moveVersion(tx, scene, {
    act: 'ask',
    actorId: asker.id,
    details: { request: requestId, reviewers: reviewers.map(({ id }) => id), due, checklist },
  })
  for (const { id, name, email } of reviewers) {
    if (id === asker.id) continue
    await postMail(tx, {
      template: 'review-asked',
      to: { email, name, userId: id },
      data: {
        ...{ scene: scene.title, version: number, asker: asker.name, due, message },
        url: reviewUrl(scene.id, number),
      },
      key: `review-asked:${requestId}:${id}`,
      workshopId: scene.workshopId,
    })
  }
  await planReminders(tx, requestId, due, new Date())
}

function refuseStrangers(wanted: readonly string[], found: readonly { id: string }[]) {
  const known = new Set(found.map(({ id }) => id))
  const issues = wanted.flatMap((id, index) =>
    known.has(id)
      ? []
      : [
          {
            path: `reviewers.${index}`,
            code: 'not-a-reviewer',
            message: 'This is nobody of the workshop who may give a verdict.',
            fix: 'Choose an owner or a reviewer of the workshop.',
          },
        ],
  )
  if (issues.length > 0) throw refused(issues)
}

/** A day is past when it is so everywhere on earth. */
function refusePast(due: string) {
  const westernmost = new Date(Date.now() - 12 * 3_600_000).toISOString().slice(0, 10)
  if (due >= westernmost) return
  const message = `${due} is past.`
  throw refused([{ path: 'due', code: 'past', message, fix: 'Give today or a later day.' }])
}
