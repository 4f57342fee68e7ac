import { giveVerdict as contract } from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { giveVerdict } from '@/lib/services/reviews/give-verdict'

export const POST = handle(contract, ({ person, params, body, idempotencyKey }) =>
  giveVerdict(person, params.id, params.number, body, idempotencyKey),
)
