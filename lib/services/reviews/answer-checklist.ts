import { sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { checklistAnswers } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import type { BodyOf } from '@/lib/contracts/operation'
import type { answerChecklist as contract, Review } from '@/lib/contracts/verdicts'
import { Problem, refused } from '@/lib/errors/problem'
import { audit } from '../audit'
import { reviewAnswer } from './review-answer'
import { reviewGround } from './review-ground'
import { holdVersion } from './review-scene'

/** One's own answers; each change of one is in the audit log, so that the evidence keeps what was said before. */
export async function answerChecklist(
  person: Person | null,
  id: string,
  number: number,
  { answers }: BodyOf<typeof contract>,
): Promise<{ review: Review }> {
  return write(async (tx) => {
    const scene = await holdVersion(tx, person, 'verdict.give', id, number)
    const judge = person as Person
    const { latest, items } = await reviewGround(tx, scene, judge.id)
    if (!latest || latest.request.endedAt) {
      throw new Problem(
        'held',
        `No review of version ${number} is open, so nothing is asked.`,
        'Ask for a review first.',
        { members: { held: 'state', state: scene.version.state } },
      )
    }
    const beyond = answers.flatMap(({ item }, index) => (item < items ? [] : [index]))
    if (beyond.length > 0) {
      throw refused(
        beyond.map((index) => ({
          path: `answers.${index}.item`,
          code: 'unknown-item',
          message: `The checklist has ${items} items, counted from 0.`,
          fix: `Give an item from 0 to ${items - 1}.`,
        })),
      )
    }
    // of one item answered twice the last counts
    const last = [...new Map(answers.map((answer) => [answer.item, answer])).values()]
    await tx
      .insert(checklistAnswers)
      .values(last.map((answer) => ({ ...answer, requestId: latest.request.id, userId: judge.id })))
      .onConflictDoUpdate({
        target: [checklistAnswers.requestId, checklistAnswers.userId, checklistAnswers.item],
        set: {
          answer: sql`excluded.answer`,
          words: sql`excluded.words`,
          answeredAt: sql`now()`,
        },
      })
    await audit(tx, {
      actorId: judge.id,
      workshopId: scene.workshopId,
      operation: 'checklist.answer',
      subject: `scene:${id}`,
      after: { version: number, request: latest.request.id, answers: last },
    })
    return { review: await reviewAnswer(tx, judge, scene) }
  })
}
