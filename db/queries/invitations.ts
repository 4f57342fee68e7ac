import { and, desc, eq, isNull, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { invitations, users, workshops } from '../schema'
import type { TimePosition } from './people'

const withInviter = (tx: Transaction) =>
  tx
    .select({ invitation: invitations, invitedBy: users.name, workshop: workshops.name })
    .from(invitations)
    .innerJoin(users, eq(users.id, invitations.invitedBy))
    .innerJoin(workshops, eq(workshops.id, invitations.workshopId))
    .$dynamic()

export type InvitationRow = Awaited<ReturnType<typeof withInviter>>[number]

/** A workshop's invitations, newest first. */
export function pageOfInvitations(
  tx: Transaction,
  workshopId: string,
  after: TimePosition | undefined,
  limit: number,
) {
  return withInviter(tx)
    .where(
      and(
        eq(invitations.workshopId, workshopId),
        after &&
          sql`(${invitations.createdAt}, ${invitations.id}) < (${after.at}::timestamptz, ${after.id}::uuid)`,
      ),
    )
    .orderBy(desc(invitations.createdAt), desc(invitations.id))
    .limit(limit + 1)
}

export async function invitationById(tx: Transaction, id: string): Promise<InvitationRow | undefined> {
  const [found] = await withInviter(tx).where(eq(invitations.id, id))
  return found
}

const unanswered = and(isNull(invitations.acceptedAt), isNull(invitations.withdrawnAt))

/** The one that is neither accepted nor withdrawn, though it may have ended. */
export async function unansweredInvitation(tx: Transaction, workshopId: string, email: string) {
  const [found] = await tx
    .select()
    .from(invitations)
    .where(and(eq(invitations.workshopId, workshopId), eq(invitations.email, email), unanswered))
  return found
}

export const countUnanswered = (tx: Transaction, workshopId: string) =>
  tx.$count(invitations, and(eq(invitations.workshopId, workshopId), unanswered))

const open = (tokenHash: string) =>
  and(eq(invitations.tokenHash, tokenHash), unanswered, sql`${invitations.endsAt} > now()`)

/** What an invitation that can still be accepted says; used, ended, withdrawn and unknown ones are told alike. */
export async function openInvitation(tx: Transaction, tokenHash: string): Promise<InvitationRow | undefined> {
  const [found] = await withInviter(tx).where(open(tokenHash))
  return found
}

/** The same, held until the transaction ends: of two who accept at once the second finds it used. */
export async function lockOpenInvitation(tx: Transaction, tokenHash: string) {
  const [found] = await tx.select().from(invitations).where(open(tokenHash)).for('update')
  return found
}
