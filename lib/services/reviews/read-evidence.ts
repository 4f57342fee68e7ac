import { read } from '@/db/client'
import { answersOf, openingsOf, requestsOf, reviewersOf, verdictsOf } from '@/db/queries/reviews'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { Evidence } from '@/lib/contracts/verdicts'
import { notFound } from '@/lib/errors/problem'
import { requestAnswer, verdictAnswer } from './review-answer'
import { withVersion } from './review-scene'

/** Who opened a version, what was asked about it, what each answered and said. */
export async function readEvidence(
  person: Person | null,
  id: string,
  number: number,
): Promise<{ evidence: Evidence }> {
  return read(async (tx) => {
    const scene = await sceneById(tx, id)
    authorise(person, 'review.read', scene)
    if (!scene) throw notFound('scene')
    await withVersion(tx, scene, number)
    const requests = await requestsOf(tx, id, number)
    const ids = requests.map(({ request }) => request.id)
    const reviewers = await reviewersOf(tx, ids)
    const asked = requests.map((row) => requestAnswer(row, reviewers))
    const checklists = new Map(asked.map((request) => [request.id, request.checklist]))
    const answers = await answersOf(tx, ids)
    return {
      evidence: {
        openings: (await openingsOf(tx, id, number)).map(({ person, firstAt, lastAt }) => ({
          person,
          firstAt: firstAt.toISOString(),
          lastAt: lastAt.toISOString(),
        })),
        requests: asked,
        answers: answers.map(({ answer, person }) => ({
          request: answer.requestId,
          person,
          item: checklists.get(answer.requestId)?.[answer.item] ?? '',
          answer: answer.answer,
          words: answer.words,
          at: answer.answeredAt.toISOString(),
        })),
        verdicts: (await verdictsOf(tx, id, number)).map(verdictAnswer),
      },
    }
  })
}
