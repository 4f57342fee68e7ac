import { getSession } from '@/lib/contracts/people'
import { personOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { personAnswer } from '@/lib/services/person-answer'

export const GET = handle(getSession, async ({ request }) => {
  const person = await personOf(request)
  return { person: person && personAnswer(person) }
})
