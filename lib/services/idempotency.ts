import { createHash } from 'node:crypto'
import { and, eq } from 'drizzle-orm'
import { z } from 'zod'
import type { Transaction } from '@/db/client'
import { idempotencyKeys } from '@/db/schema'
import { Problem } from '@/lib/errors/problem'

/** What was asked: another request under the same key is an error. */
export const requestHash = (...parts: unknown[]) =>
  createHash('sha256').update(JSON.stringify(parts)).digest('hex')

/** Where to find a version that was made. */
export const versionPlace = z.object({ sceneId: z.string(), version: z.number() })
export type VersionPlace = z.output<typeof versionPlace>
/** The same of a note in its scene. */
export const notePlace = z.object({ number: z.number() })

/**
 * Does the work once for each person and key: a repetition, also one at the same moment, finds what the first made by the
 * place that was kept of it.
 */
export async function once<Place extends object>(
  tx: Transaction,
  userId: string,
  key: string | undefined,
  hash: string,
  placeSchema: z.ZodType<Place>,
  work: () => Promise<Place>,
): Promise<Place> {
  if (key === undefined) return work()
  // a second one waits here for the first to commit or to fail
  const [mine] = await tx
    .insert(idempotencyKeys)
    .values({ userId, key, requestHash: hash, answer: {} })
    .onConflictDoNothing()
    .returning()
  const thisKey = and(eq(idempotencyKeys.userId, userId), eq(idempotencyKeys.key, key))
  if (mine) {
    const answer = await work()
    await tx.update(idempotencyKeys).set({ answer }).where(thisKey)
    return answer
  }
  const [first] = await tx.select().from(idempotencyKeys).where(thisKey)
  if (first.requestHash === hash) return placeSchema.parse(first.answer)
  throw new Problem(
    'taken',
    'This Idempotency-Key was used for another request.',
    'Use a new key for each thing to be done.',
  )
}
