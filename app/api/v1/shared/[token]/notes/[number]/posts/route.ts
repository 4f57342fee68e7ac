import { replyAsGuest as contract } from '@/lib/contracts/guest-notes'
import { handle } from '@/lib/http/handle'
import { linkKeyOf } from '@/lib/http/link-key'
import { replyAsGuest } from '@/lib/services/notes/guest-notes'

export const POST = handle(contract, async ({ request, params, body }) => ({
  note: await replyAsGuest(linkKeyOf(request, params.token), params.number, body),
}))
