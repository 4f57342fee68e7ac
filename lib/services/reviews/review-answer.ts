import type { Transaction } from '@/db/client'
import {
  approvalRow,
  peopleWith,
  reviewersOf,
  reviewRules,
  verdictsOf,
  type RequestRow,
  type VerdictRow,
} from '@/db/queries/reviews'
import { allow, holds, roles, type Person } from '@/lib/auth/access'
import { checklistSchema, type Review, type Verdict } from '@/lib/contracts/verdicts'
import { canonicalJson } from '@/lib/review/canonical-json'
import { heldBy } from '@/lib/review/held'
import { acts, rightOf } from '@/lib/review/transitions'
import { reviewGround, type ReviewGround } from './review-ground'
import type { HeldScene } from './review-scene'

export const verdictAnswer = ({ verdict, person }: VerdictRow): Verdict => ({
  id: verdict.id,
  person: verdict.guestName ?? person ?? '',
  guest: verdict.linkId !== null,
  word: verdict.word,
  sentence: verdict.sentence,
  at: verdict.createdAt.toISOString(),
  hash: verdict.hash,
})

type Reviewers = Awaited<ReturnType<typeof reviewersOf>>

export const requestAnswer = ({ request, asker }: RequestRow, reviewers: Reviewers) => ({
  id: request.id,
  askedBy: asker,
  askedAt: request.createdAt.toISOString(),
  due: request.due,
  message: request.message,
  checklist: checklistSchema.parse(request.checklist),
  reviewers: reviewers
    .filter(({ requestId }) => requestId === request.id)
    .map(({ id, name }) => ({ id, name })),
  ended: request.endedAs,
})

/** Roles whose people may be asked. */
export const judging = roles.filter((role) => holds(role, 'verdict.give'))

/** Where the review of a version stands, for somebody who may read it. */
export async function reviewAnswer(tx: Transaction, person: Person, scene: HeldScene): Promise<Review> {
  const { version } = scene
  const ground = await reviewGround(tx, scene, person.id)
  const reviewers = ground.latest ? await reviewersOf(tx, [ground.latest.request.id]) : []
  const approved = await approvalRow(tx, scene.id)
  const mayAsk = allow(person, 'review.ask', scene)
  const judges = mayAsk ? await peopleWith(tx, scene.workshopId, judging) : []
  const rules = await reviewRules(tx, scene.workshopId)
  return {
    sceneId: scene.id,
    title: scene.title,
    version: version.number,
    headVersion: scene.headVersion,
    author: version.author,
    state: version.state,
    reason: version.reason,
    request: ground.latest ? requestAnswer(ground.latest, reviewers) : null,
    answers: ground.answers
      .filter(({ answer }) => answer.userId === person.id)
      .map(({ answer: { item, answer, words } }) => ({ item, answer, words })),
    answered: answeredBy(ground, allow(person, 'verdict.give', scene) ? person.id : null),
    verdicts: (await verdictsOf(tx, scene.id, version.number)).map(verdictAnswer),
    openErrors: [...ground.openErrors],
    approved: approved
      ? {
          version: approved.version,
          person: approved.person,
          at: approved.at.toISOString(),
          same: canonicalJson(approved.document) === canonicalJson(version.document),
        }
      : null,
    offers: acts.flatMap((act) => {
      const right = rightOf[act]
      return right && allow(person, right, scene) ? [{ act, held: heldBy(act, ground)?.words ?? null }] : []
    }),
    judges: judges.map(({ id, name, role }) => ({ id, name, role })),
    standardChecklist: checklistSchema.parse(rules?.checklist ?? []),
  }
}

/** By this person, or by whoever has answered most. */
function answeredBy({ answers }: ReviewGround, userId: string | null): number {
  const counts = new Map<string, number>()
  for (const { answer } of answers) counts.set(answer.userId, (counts.get(answer.userId) ?? 0) + 1)
  return userId ? (counts.get(userId) ?? 0) : Math.max(0, ...counts.values())
}
