import { and, eq, lt, sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { apiTokens, sessions } from '@/db/schema'
import { hashToken } from './tokens'

/** When somebody was last here is known to the minute: so a request seldom writes. */
const minute = 60_000

export const isStale = (at: Date | null, now = Date.now()) => at === null || now - at.getTime() >= minute

const minuteAgo = sql`now() - interval '1 minute'`

export const markSeen = (sessionToken: string) =>
  write((tx) =>
    tx
      .update(sessions)
      .set({ lastSeenAt: sql`now()` })
      .where(and(eq(sessions.id, hashToken(sessionToken)), lt(sessions.lastSeenAt, minuteAgo))),
  )

export const markUsed = (apiTokenId: string) =>
  write((tx) =>
    tx
      .update(apiTokens)
      .set({ lastUsedAt: sql`now()` })
      .where(
        and(
          eq(apiTokens.id, apiTokenId),
          sql`(${apiTokens.lastUsedAt} is null or ${apiTokens.lastUsedAt} < ${minuteAgo})`,
        ),
      ),
  )
