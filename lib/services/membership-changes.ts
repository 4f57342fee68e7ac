import { and, eq, isNull, sql } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { countOwners, memberOf, placeOf, type MemberRow } from '@/db/queries/people'
import { apiTokens, memberships, users } from '@/db/schema'
import type { Role } from '@/lib/auth/access'
import { notFound, Problem } from '@/lib/errors/problem'

export async function memberToChange(
  tx: Transaction,
  workshopId: string,
  userId: string,
): Promise<MemberRow> {
  const member = await memberOf(tx, workshopId, userId)
  if (!member) throw notFound('person')
  return member
}

export const setRole = (tx: Transaction, workshopId: string, userId: string, role: Role) =>
  tx.update(memberships).set({ role }).where(placeOf(workshopId, userId))

/** They are still who they are, but of this workshop they see nothing more, nor does any program of theirs. */
export async function endMembership(tx: Transaction, workshopId: string, userId: string): Promise<void> {
  await tx.delete(memberships).where(placeOf(workshopId, userId))
  await tx
    .update(apiTokens)
    .set({ revokedAt: sql`now()` })
    .where(
      and(eq(apiTokens.workshopId, workshopId), eq(apiTokens.userId, userId), isNull(apiTokens.revokedAt)),
    )
  await tx
    .update(users)
    .set({ workshopId: null })
    .where(and(eq(users.id, userId), eq(users.workshopId, workshopId)))
}

/** Asked after a change, in its transaction and with the workshop held: what would leave it ownerless is undone. */
export async function requireOwner(tx: Transaction, workshopId: string): Promise<void> {
  if ((await countOwners(tx, workshopId)) > 0) return
  throw new Problem(
    'held',
    'The workshop would be left without an owner.',
    'Make somebody else an owner first.',
  )
}
