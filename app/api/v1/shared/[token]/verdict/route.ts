import { giveGuestVerdict as contract } from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { linkKeyOf } from '@/lib/http/link-key'
import { giveGuestVerdict } from '@/lib/services/reviews/give-guest-verdict'

export const POST = handle(contract, ({ request, params, body }) =>
  giveGuestVerdict(linkKeyOf(request, params.token), body),
)
