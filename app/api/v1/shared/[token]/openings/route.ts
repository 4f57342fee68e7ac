import { countOpening as contract } from '@/lib/contracts/shared'
import { personOf, userAgentOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { linkKeyOf } from '@/lib/http/link-key'
import { countOpening } from '@/lib/services/count-opening'

export const POST = handle(contract, async ({ request, params }) =>
  countOpening(linkKeyOf(request, params.token), {
    userAgent: userAgentOf(request),
    person: await personOf(request),
  }),
)
