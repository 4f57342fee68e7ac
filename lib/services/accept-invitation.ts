import { eq, sql } from 'drizzle-orm'
import { read, write, type Transaction } from '@/db/client'
import { lockOpenInvitation, openInvitation } from '@/db/queries/invitations'
import { lockWorkshop } from '@/db/queries/people'
import { invitations, memberships, users } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { personOfUser } from '@/lib/auth/person'
import type { NewSession } from '@/lib/auth/sessions'
import { hashToken } from '@/lib/auth/tokens'
import { invitationUnavailable, notSignedIn, Problem } from '@/lib/errors/problem'
import { audit } from './audit'
import { openAccount } from './sign-up'

interface Acceptance {
  token: string
  /** For somebody without an account: it is made for the address that was invited. */
  account?: { name: string; password: string }
  userAgent: string
}

/** Joins, once: with the account that has the invited address, or with a new one for it. */
export async function acceptInvitation(
  person: Person | null,
  { token, account, userAgent }: Acceptance,
): Promise<{ person: Person; session: NewSession | null }> {
  const tokenHash = hashToken(token)
  if (person) {
    const { id, name, email } = person
    const joined = await write(async (tx) => {
      const workshopId = await join(tx, tokenHash, { id, email })
      return personOfUser(tx, { id, name, email, workshopId })
    })
    return { person: joined, session: null }
  }
  // before the work of a new password, which nobody is to have for nothing
  const found = await read((tx) => openInvitation(tx, tokenHash))
  if (!found) throw invitationUnavailable()
  if (!account) throw notSignedIn()
  const { email } = found.invitation
  return openAccount({ ...account, email }, userAgent, (tx, id) => join(tx, tokenHash, { id, email }))
}

async function join(
  tx: Transaction,
  tokenHash: string,
  { id, email }: { id: string; email: string },
): Promise<string> {
  // workshop before invitation, as everything that changes who belongs to it takes them
  const place = (await openInvitation(tx, tokenHash))?.invitation
  if (place) await lockWorkshop(tx, place.workshopId)
  const invitation = await lockOpenInvitation(tx, tokenHash)
  if (!invitation) throw invitationUnavailable()
  if (invitation.email !== email) {
    throw new Problem(
      'not-allowed',
      `This invitation is for ${invitation.email}; you are signed in as ${email}.`,
      'Sign out, then open the link again.',
    )
  }
  const { workshopId, role } = invitation
  // somebody who is in already keeps the role they have
  await tx.insert(memberships).values({ workshopId, userId: id, role }).onConflictDoNothing()
  await tx.update(users).set({ workshopId }).where(eq(users.id, id))
  await tx
    .update(invitations)
    .set({ acceptedAt: sql`now()`, acceptedBy: id })
    .where(eq(invitations.id, invitation.id))
  await audit(tx, {
    actorId: id,
    workshopId,
    operation: 'person.join',
    subject: `invitation:${invitation.id}`,
    after: { role },
  })
  return workshopId
}
