import { askQuestion as contract } from '@/lib/contracts/shared'
import { clientAddress } from '@/lib/http/client-address'
import { handle } from '@/lib/http/handle'
import { linkKeyOf } from '@/lib/http/link-key'
import { askQuestion } from '@/lib/services/ask-question'

export const POST = handle(contract, ({ request, params, body }) =>
  askQuestion(linkKeyOf(request, params.token), body, clientAddress(request)),
)
