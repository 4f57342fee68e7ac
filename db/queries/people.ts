import { and, asc, eq, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { memberships, users, workshops } from '../schema'

const person = {
  id: users.id,
  name: users.name,
  email: users.email,
  role: memberships.role,
  since: memberships.createdAt,
}

const members = (tx: Transaction) =>
  tx.select(person).from(memberships).innerJoin(users, eq(users.id, memberships.userId)).$dynamic()

export type MemberRow = Awaited<ReturnType<typeof members>>[number]

/** Where a page of people or invitations ended. */
export interface TimePosition {
  at: string
  id: string
}

/** A workshop's people in the order in which they came. */
export function pageOfPeople(
  tx: Transaction,
  workshopId: string,
  after: TimePosition | undefined,
  limit: number,
) {
  return members(tx)
    .where(
      and(
        eq(memberships.workshopId, workshopId),
        after && sql`(${memberships.createdAt}, ${users.id}) > (${after.at}::timestamptz, ${after.id}::uuid)`,
      ),
    )
    .orderBy(asc(memberships.createdAt), asc(users.id))
    .limit(limit + 1)
}

export const placeOf = (workshopId: string, userId: string) =>
  and(eq(memberships.workshopId, workshopId), eq(memberships.userId, userId))

export async function memberOf(
  tx: Transaction,
  workshopId: string,
  userId: string,
): Promise<MemberRow | undefined> {
  const [found] = await members(tx).where(placeOf(workshopId, userId))
  return found
}

export const countOwners = (tx: Transaction, workshopId: string) =>
  tx.$count(memberships, and(eq(memberships.workshopId, workshopId), eq(memberships.role, 'owner')))

export async function workshopById(tx: Transaction, id: string) {
  const [workshop] = await tx.select().from(workshops).where(eq(workshops.id, id))
  return workshop
}
export type WorkshopRow = NonNullable<Awaited<ReturnType<typeof workshopById>>>

/** Held until the transaction ends: of two that change who belongs to it the second waits for the first. */
export async function lockWorkshop(tx: Transaction, id: string) {
  const [workshop] = await tx.select().from(workshops).where(eq(workshops.id, id)).for('no key update')
  return workshop
}
