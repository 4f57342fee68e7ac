import { randomUUID } from 'node:crypto'
import { expect } from 'vitest'
import type postgres from 'postgres'
import type { Review } from '@/lib/contracts/verdicts'
import { call, type Answer } from './call'
import { sceneOf } from './documents'
import type { Someone } from './people'

/** A day so many days from now, as a review is due. */
export const dayFromNow = (days: number) =>
  new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10)

export async function newVersion(someone: Someone, sceneId: string, base: number, angleDeg: number) {
  const body = { base, message: `At ${angleDeg}`, document: sceneOf('single-450', { angleDeg }) }
  const answer = await call('POST', `/api/v1/scenes/${sceneId}/versions`, { cookie: someone.cookie, body })
  expect(answer.status).toBe(201)
}

/** What one person does about a version of a scene, over HTTP. */
export function reviewing(someone: Someone, sceneId: string, number = 1) {
  const at = `/api/v1/scenes/${sceneId}/versions/${number}`
  const send = (method: string, path: string, body?: unknown, headers = {}) =>
    call(method, `${at}/${path}`, { cookie: someone.cookie, body, headers })
  return {
    read: async () => ((await send('GET', 'review')).body as { review: Review }).review,
    ask: (reviewers: Someone[], more: object = {}) =>
      send('POST', 'review', { reviewers: reviewers.map(({ id }) => id), due: dayFromNow(7), ...more }),
    callOff: () => send('DELETE', 'review'),
    answer: (...answers: object[]) => send('PUT', 'checklist', { answers }),
    answerAll: (items = 6) =>
      send('PUT', 'checklist', {
        answers: Array.from({ length: items }, (_, item) => ({ item, answer: 'yes' })),
      }),
    say: (word: string, sentence = 'Seen.', headers = {}) =>
      send('POST', 'verdicts', { word, sentence }, headers),
    withdraw: (reason: string) => send('POST', 'withdraw', { reason }),
    approval: () => send('GET', 'approval'),
    open: () => send('POST', 'openings'),
    evidence: () => send('GET', 'evidence'),
  }
}

export const reviewIn = (answer: Answer) => (answer.body as { review: Review }).review

/** A note that is an open error, pinned nowhere in particular. */
export async function openError(sql: postgres.Sql, author: Someone, sceneId: string, version = 1) {
  const [{ number }] = await sql`
    insert into notes (id, scene_id, number, version, kind, heading, author_id, anchor, part_id, part)
    select ${randomUUID()}, ${sceneId}, coalesce(max(number), 0) + 1, ${version}, 'error', 'Gap', ${author.id}, '{}',
      'piston:1', 'piston 1' from notes where scene_id = ${sceneId} returning number`
  return number as number
}
