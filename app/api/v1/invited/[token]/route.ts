import { sessionCookie } from '@/lib/auth/sessions'
import * as contracts from '@/lib/contracts/invitations'
import { personOf, userAgentOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { acceptInvitation } from '@/lib/services/accept-invitation'
import { lookAtInvitation } from '@/lib/services/look-at-invitation'
import { personAnswer } from '@/lib/services/person-answer'

export const GET = handle(contracts.lookAtInvitation, ({ params }) => lookAtInvitation(params.token))

export const POST = handle(contracts.acceptInvitation, async ({ request, params, body, headers }) => {
  const { person, session } = await acceptInvitation(await personOf(request), {
    token: params.token,
    account: body.account,
    userAgent: userAgentOf(request),
  })
  if (session) headers.append('set-cookie', sessionCookie(session.token).serialize())
  return { person: personAnswer(person) }
})
