import { sendInvitationAgain as contract } from '@/lib/contracts/invitations'
import { handle } from '@/lib/http/handle'
import { sendInvitationAgain } from '@/lib/services/send-invitation-again'

export const POST = handle(contract, async ({ person, params }) => ({
  invitation: await sendInvitationAgain(person, params.id),
}))
