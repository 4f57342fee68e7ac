import { z } from 'zod'
import type { TimePosition } from '@/db/queries/people'
import { Problem } from '@/lib/errors/problem'

const position = z.tuple([z.iso.datetime(), z.uuid()])

export function readTimeCursor(text: string | undefined): TimePosition | undefined {
  if (text === undefined) return undefined
  try {
    const [at, id] = position.parse(JSON.parse(Buffer.from(text, 'base64url').toString()))
    return { at, id }
  } catch {
    throw new Problem('unreadable', 'The page asked for cannot be found.', 'Begin again without `after`.')
  }
}

/** The rows of a page of which one more was read, and where the next page begins. */
export function cutPage<Row>(rows: Row[], limit: number, placeOf: (row: Row) => { at: Date; id: string }) {
  const shown = rows.slice(0, limit)
  const last = shown.at(-1)
  if (rows.length <= limit || !last) return { shown, next: null }
  const { at, id } = placeOf(last)
  return { shown, next: Buffer.from(JSON.stringify([at.toISOString(), id])).toString('base64url') }
}
