import { keepLooking as contract } from '@/lib/contracts/shared'
import { handle } from '@/lib/http/handle'
import { linkKeyOf } from '@/lib/http/link-key'
import { keepLooking } from '@/lib/services/count-opening'

export const POST = handle(contract, ({ request, params, body }) =>
  keepLooking(linkKeyOf(request, params.token), params.opening, body),
)
