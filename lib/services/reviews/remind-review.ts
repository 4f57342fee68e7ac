import { and, eq, isNull } from 'drizzle-orm'
import { write } from '@/db/client'
import { peopleWith, reviewersOf } from '@/db/queries/reviews'
import { reviewRequests, scenes, users } from '@/db/schema'
import { postMail } from '../mail/post-mail'
import type { Reminder } from './plan-reminders'
import { judging } from './review-answer'
import { reviewUrl } from './review-scene'

/** One mail a person and reminder, however often this runs; none once the review has ended or they may not judge any more. */
export async function remindReview(requestId: string, reminder: Reminder): Promise<void> {
  await write(async (tx) => {
    const [found] = await tx
      .select({ request: reviewRequests, scene: scenes, asker: users.name })
      .from(reviewRequests)
      .innerJoin(scenes, eq(scenes.id, reviewRequests.sceneId))
      .innerJoin(users, eq(users.id, reviewRequests.askedBy))
      .where(and(eq(reviewRequests.id, requestId), isNull(reviewRequests.endedAt), isNull(scenes.archivedAt)))
    if (!found) return
    const { request, scene, asker } = found
    const judges = new Set((await peopleWith(tx, scene.workshopId, judging)).map(({ id }) => id))
    for (const { id, name, email } of await reviewersOf(tx, [requestId])) {
      if (!judges.has(id)) continue
      await postMail(tx, {
        template: 'review-reminder',
        to: { email, name, userId: id },
        data: {
          ...{ scene: scene.title, version: request.version, asker, due: request.due },
          url: reviewUrl(scene.id, request.version),
        },
        key: `review-reminder:${requestId}:${reminder}:${id}`,
        workshopId: scene.workshopId,
      })
    }
  })
}
