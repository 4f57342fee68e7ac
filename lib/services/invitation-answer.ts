import type { InvitationRow } from '@/db/queries/invitations'
import type { Invitation } from '@/lib/contracts/invitations'

export function invitationAnswer({ invitation, invitedBy }: InvitationRow, now: Date): Invitation {
  const { acceptedAt, withdrawnAt, endsAt } = invitation
  return {
    id: invitation.id,
    email: invitation.email,
    role: invitation.role,
    invitedBy,
    state: acceptedAt ? 'accepted' : withdrawnAt ? 'withdrawn' : endsAt <= now ? 'ended' : 'open',
    sentAt: invitation.sentAt.toISOString(),
    endsAt: endsAt.toISOString(),
    acceptedAt: acceptedAt?.toISOString() ?? null,
    withdrawnAt: withdrawnAt?.toISOString() ?? null,
  }
}
