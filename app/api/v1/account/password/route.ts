import { changePassword as contract } from '@/lib/contracts/account'
import { sessionTokenOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { changePassword } from '@/lib/services/change-account'

export const PUT = handle(contract, async ({ request, person, body }) => ({
  ended: await changePassword(person, body, sessionTokenOf(request)),
}))
