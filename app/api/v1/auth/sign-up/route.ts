import { sessionCookie } from '@/lib/auth/sessions'
import { signUp as contract } from '@/lib/contracts/people'
import { userAgentOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { personAnswer } from '@/lib/services/person-answer'
import { signUp } from '@/lib/services/sign-up'

export const POST = handle(contract, async ({ request, body, headers }) => {
  const { person, session } = await signUp(body, userAgentOf(request))
  headers.append('set-cookie', sessionCookie(session.token).serialize())
  return { person: personAnswer(person) }
})
