import { read } from '@/db/client'
import { openInvitation } from '@/db/queries/invitations'
import { userByEmail } from '@/db/queries/users'
import { hashToken } from '@/lib/auth/tokens'
import type { InvitationLook } from '@/lib/contracts/invitations'
import { invitationUnavailable } from '@/lib/errors/problem'

/** What an invitation says to whoever holds its link. Looking changes nothing. */
export async function lookAtInvitation(token: string): Promise<InvitationLook> {
  return read(async (tx) => {
    const found = await openInvitation(tx, hashToken(token))
    if (!found) throw invitationUnavailable()
    const { email, role, endsAt } = found.invitation
    return {
      workshop: found.workshop,
      inviter: found.invitedBy,
      email,
      role,
      endsAt: endsAt.toISOString(),
      hasAccount: (await userByEmail(tx, email)) !== undefined,
    }
  })
}
