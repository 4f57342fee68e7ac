import { withdrawInvitation as contract } from '@/lib/contracts/invitations'
import { handle } from '@/lib/http/handle'
import { withdrawInvitation } from '@/lib/services/withdraw-invitation'

export const DELETE = handle(contract, ({ person, params }) => withdrawInvitation(person, params.id))
