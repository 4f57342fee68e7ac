import { sessionCookie } from '@/lib/auth/sessions'
import { signIn as contract } from '@/lib/contracts/people'
import { userAgentOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { personAnswer } from '@/lib/services/person-answer'
import { signIn } from '@/lib/services/sign-in'

export const POST = handle(contract, async ({ request, body, headers }) => {
  const { person, session } = await signIn(body.email, body.password, userAgentOf(request))
  headers.append('set-cookie', sessionCookie(session.token).serialize())
  return { person: personAnswer(person) }
})
