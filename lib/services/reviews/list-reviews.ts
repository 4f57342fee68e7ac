import { read } from '@/db/client'
import { pageOfReviews, placeOfReview, reviewersOf } from '@/db/queries/reviews'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { AnswerOf, QueryOf } from '@/lib/contracts/operation'
import type { listReviews as contract } from '@/lib/contracts/verdicts'
import { cutPage, readTimeCursor } from '../page-cursor'
import { workshopOf } from '../workshop-of'

export async function listReviews(
  person: Person | null,
  query: QueryOf<typeof contract>,
): Promise<AnswerOf<typeof contract>> {
  const workshopId = person ? workshopOf(person, query.workshop) : ''
  authorise(person, 'review.read', { workshopId }, 'workshop')
  const { list, limit } = query
  const after = readTimeCursor(query.after)
  return read(async (tx) => {
    const rows = await pageOfReviews(tx, { workshopId, userId: person.id, list, after, limit })
    const { shown, next } = cutPage(rows, limit, (row) => placeOfReview(row, list))
    const reviewers = await reviewersOf(
      tx,
      shown.map(({ request }) => request.id),
    )
    return {
      reviews: shown.map(({ request, title, headVersion, state, askedBy }) => ({
        ...{ id: request.id, sceneId: request.sceneId, version: request.version },
        ...{ title, headVersion, state, askedBy },
        askedAt: request.createdAt.toISOString(),
        due: request.due,
        message: request.message,
        reviewers: reviewers.filter(({ requestId }) => requestId === request.id).map(({ name }) => name),
        ended: request.endedAs,
        endedAt: request.endedAt?.toISOString() ?? null,
      })),
      next,
    }
  })
}
