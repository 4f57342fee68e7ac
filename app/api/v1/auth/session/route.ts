import { personOfToken } from '@/lib/auth/person'
import { getSession } from '@/lib/contracts/people'
import { handle, sessionTokenOf } from '@/lib/http/handle'
import { personAnswer } from '@/lib/services/person-answer'

export const GET = handle(getSession, async ({ request }) => {
  const person = await personOfToken(sessionTokenOf(request))
  return { person: person && personAnswer(person) }
})
