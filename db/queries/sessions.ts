import { and, desc, eq, gt, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { sessions } from '../schema'

/** Somebody's sessions that still open something, the one seen last first. */
export const sessionsOf = (tx: Transaction, userId: string) =>
  tx
    .select()
    .from(sessions)
    .where(and(eq(sessions.userId, userId), gt(sessions.expiresAt, sql`now()`)))
    .orderBy(desc(sessions.lastSeenAt), desc(sessions.name))
    .limit(100)
