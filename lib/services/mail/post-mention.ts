import { and, eq, isNull, min } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { mentions } from '@/db/schema'
import { addJob } from '@/lib/queue/add-job'

/** At most one mail in this time tells somebody where they were named. */
export const gatherMs = 10 * 60_000

interface Mentioned {
  userId: string
  sceneId: string
  noteId: string
  /** The post of its thread that names them; the first is the note’s own words. */
  postId: string
}

/** Notes that somebody was named; they are told in one mail with whatever else comes within ten minutes. */
export async function postMention(tx: Transaction, mentioned: Mentioned): Promise<void> {
  const [row] = await tx.insert(mentions).values(mentioned).onConflictDoNothing().returning()
  if (!row) return
  const [{ oldest }] = await tx
    .select({ oldest: min(mentions.createdAt) })
    .from(mentions)
    .where(and(eq(mentions.userId, mentioned.userId), isNull(mentions.toldAt)))
  // counted from the first that waits: the next one must not put it off
  const first = oldest ?? row.createdAt
  await queueDigest(tx, mentioned.userId, new Date(first.getTime() + gatherMs))
}

export const queueDigest = (tx: Transaction, userId: string, runAt: Date) =>
  addJob(tx, 'mail.digest', { userId }, { key: `digest:${userId}`, runAt })
