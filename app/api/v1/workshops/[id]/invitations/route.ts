import * as contracts from '@/lib/contracts/invitations'
import { handle } from '@/lib/http/handle'
import { invitePerson } from '@/lib/services/invite-person'
import { listInvitations } from '@/lib/services/list-invitations'

export const GET = handle(contracts.listInvitations, ({ person, params, query }) =>
  listInvitations(person, params.id, query),
)

export const POST = handle(contracts.invitePerson, async ({ person, params, body }) => ({
  invitation: await invitePerson(person, params.id, body),
}))
