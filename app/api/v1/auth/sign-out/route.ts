import { blankSessionCookie } from '@/lib/auth/sessions'
import { signOut as contract } from '@/lib/contracts/people'
import { sessionTokenOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { signOut } from '@/lib/services/sign-out'

export const POST = handle(contract, async ({ request, headers }) => {
  const token = sessionTokenOf(request)
  if (token) await signOut(token)
  headers.append('set-cookie', blankSessionCookie().serialize())
})
