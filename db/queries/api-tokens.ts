import { and, desc, eq, gt, isNull, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { apiTokens, memberships, users, workshops } from '../schema'

/** Neither revoked nor past its end. */
const live = and(isNull(apiTokens.revokedAt), gt(apiTokens.endsAt, sql`now()`))

/** A live token with whoever acts by it and their present role in its workshop. */
export async function liveApiToken(tx: Transaction, tokenHash: string) {
  const [found] = await tx
    .select({
      id: apiTokens.id,
      role: apiTokens.role,
      lastUsedAt: apiTokens.lastUsedAt,
      userId: users.id,
      name: users.name,
      email: users.email,
      workshopId: workshops.id,
      workshopName: workshops.name,
      presentRole: memberships.role,
    })
    .from(apiTokens)
    .innerJoin(users, eq(users.id, apiTokens.userId))
    .innerJoin(workshops, eq(workshops.id, apiTokens.workshopId))
    .innerJoin(
      memberships,
      and(eq(memberships.userId, apiTokens.userId), eq(memberships.workshopId, apiTokens.workshopId)),
    )
    .where(and(eq(apiTokens.tokenHash, tokenHash), live))
  return found
}

/** Somebody's own tokens in every workshop, newest first. */
export const apiTokensOf = (tx: Transaction, userId: string) =>
  tx
    .select({ token: apiTokens, workshop: workshops.name })
    .from(apiTokens)
    .innerJoin(workshops, eq(workshops.id, apiTokens.workshopId))
    .where(eq(apiTokens.userId, userId))
    .orderBy(desc(apiTokens.createdAt), desc(apiTokens.id))
    .limit(100)
export type ApiTokenRow = Awaited<ReturnType<typeof apiTokensOf>>[number]

export const countLiveTokens = (tx: Transaction, userId: string) =>
  tx.$count(apiTokens, and(eq(apiTokens.userId, userId), live))
