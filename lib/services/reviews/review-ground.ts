import type { Transaction } from '@/db/client'
import { answersOf, requestsOf, reviewRules, type RequestRow } from '@/db/queries/reviews'
import { checklistSchema } from '@/lib/contracts/verdicts'
import type { Ground } from '@/lib/review/held'
import { openErrors } from '../notes/open-errors'
import type { HeldScene } from './review-scene'

export interface ReviewGround extends Ground {
  /** What was asked last about this version, ended or not. */
  latest: RequestRow | undefined
  /** The checklist of what is asked now; empty when nothing is. */
  checklist: string[]
  answers: Awaited<ReturnType<typeof answersOf>>
}

/** All that can hold up what this person does to this version. */
export async function reviewGround(
  tx: Transaction,
  scene: HeldScene,
  personId: string,
): Promise<ReviewGround> {
  const { number, state, authorId } = scene.version
  const [latest] = await requestsOf(tx, scene.id, number)
  const answers = latest ? await answersOf(tx, [latest.request.id]) : []
  const checklist = latest ? checklistSchema.parse(latest.request.checklist) : []
  const mine = answers.filter(({ answer }) => answer.userId === personId)
  return {
    state,
    own: authorId === personId,
    needsTwoPeople: (await reviewRules(tx, scene.workshopId))?.needsTwoPeople ?? false,
    openErrors: await openErrors(tx, scene.id, number),
    unanswered: checklist.length - mine.length,
    items: checklist.length,
    latest,
    checklist,
    answers,
  }
}
