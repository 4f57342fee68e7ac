import { beforeAll, expect } from 'vitest'
import type postgres from 'postgres'
import type { Role } from '@/lib/auth/access'
import type { Note, NoteCounts, NoteSummary } from '@/lib/contracts/notes'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { call, type Answer } from './call'
import { sceneOf } from './documents'
import { anchorOn } from './notes'
import { newMember, newOwner, type Someone } from './people'

export const engine = 'single-450'
export const document = sceneOf(engine)

interface Cast {
  owner: Someone
  designer: Someone
  second: Someone
  reviewer: Someone
  sales: Someone
  stranger: Someone
}

/** A workshop with somebody in every role that matters to notes, and somebody of another one. */
export function useCast(server: { sql: postgres.Sql }): Cast {
  const cast = {} as Cast
  beforeAll(async () => {
    cast.owner = await newOwner()
    const member = (role: Role) => newMember(server.sql, cast.owner.workshopId, role)
    cast.designer = await member('designer')
    cast.second = await member('designer')
    cast.reviewer = await member('reviewer')
    cast.sales = await member('sales')
    cast.stranger = await newOwner('Owner of another workshop')
  })
  return cast
}

export async function newScene({ cookie }: Someone): Promise<string> {
  const made = await call('POST', '/api/v1/scenes', { cookie, body: { document } })
  return (made.body as OpenedScene).scene.id
}

export async function saveVersion(
  { cookie }: Someone,
  sceneId: string,
  base: number,
  change: (train: typeof document.train) => object,
) {
  const next = { ...document, train: { ...document.train, ...change(document.train) } }
  const body = { base, document: next }
  expect((await call('POST', `/api/v1/scenes/${sceneId}/versions`, { cookie, body })).status).toBe(201)
}

export const bodyOf = (more: object = {}) => ({
  anchor: anchorOn(engine, 'counterweight:1F'),
  kind: 'error',
  heading: 'Moment at its limit',
  words: 'Counterweight 1 free side: moment 98 % of half-disc capacity.',
  ...more,
})

export const ask = (
  someone: Partial<Someone>,
  method: string,
  sceneId: string,
  path = '',
  sent?: object,
): Promise<Answer> =>
  call(method, `/api/v1/scenes/${sceneId}/notes${path}`, { cookie: someone.cookie, body: sent })
export const noteOf = ({ body }: Answer) => (body as { note: Note }).note
export const detailOf = ({ body }: Answer) => (body as { detail: string }).detail

export async function make(someone: Someone, sceneId: string, more: object = {}): Promise<Note> {
  const made = await ask(someone, 'POST', sceneId, '', bodyOf(more))
  expect(made.status).toBe(201)
  return noteOf(made)
}

export async function list(someone: Someone, sceneId: string, query = '') {
  const answer = await ask(someone, 'GET', sceneId, query)
  expect(answer.status).toBe(200)
  return answer.body as {
    version: number
    notes: NoteSummary[]
    counts: NoteCounts
    authors: { id: string; name: string }[]
    next: number | null
  }
}

export const settle = (someone: Someone, sceneId: string, number: number, settlement: object, words = '') =>
  ask(someone, 'POST', sceneId, `/${number}/settle`, { settlement, words })

export const auditOf = async ({ sql }: { sql: postgres.Sql }, { id }: Note) =>
  (await sql`select operation from audit_log where subject = ${`note:${id}`} order by id`).map(
    ({ operation }) => operation as string,
  )
