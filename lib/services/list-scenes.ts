import { z } from 'zod'
import { read } from '@/db/client'
import { pageOfScenes, type ScenePosition } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { AnswerOf, QueryOf } from '@/lib/contracts/operation'
import type { listScenes as contract } from '@/lib/contracts/scenes'
import { Problem } from '@/lib/errors/problem'
import { sceneSummary } from './scene-answers'
import { workshopOf } from './workshop-of'

const timed = z.tuple([z.enum(['updated', 'created']), z.iso.datetime(), z.uuid()])
const titled = z.tuple([z.literal('title'), z.string(), z.uuid()])
const cursor = z.union([timed, titled])

const writeCursor = (sort: string, { value, id }: ScenePosition) =>
  Buffer.from(JSON.stringify([sort, value, id])).toString('base64url')

/** A cursor goes on with the list it came from: one of another sorting is not taken. */
function readCursor(text: string, sort: string): ScenePosition {
  try {
    const [sortedBy, value, id] = cursor.parse(JSON.parse(Buffer.from(text, 'base64url').toString()))
    if (sortedBy === sort) return { value, id }
  } catch {
    // said below
  }
  throw new Problem('unreadable', 'The page asked for cannot be found.', 'Begin again without `after`.')
}

export async function listScenes(
  person: Person | null,
  query: QueryOf<typeof contract>,
): Promise<AnswerOf<typeof contract>> {
  const workshopId = person ? workshopOf(person, query.workshop) : ''
  authorise(person, 'scene.list', { workshopId }, 'workshop')
  const after = query.after === undefined ? undefined : readCursor(query.after, query.sort)
  const page = await read((tx) => pageOfScenes(tx, { ...query, workshopId, after }))
  return {
    scenes: page.scenes.map(sceneSummary),
    next: page.next && writeCursor(query.sort, page.next),
  }
}
