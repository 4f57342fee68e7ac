import { withdrawVersion as contract } from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { withdrawVersion } from '@/lib/services/reviews/withdraw-version'

export const POST = handle(contract, ({ person, params, body }) =>
  withdrawVersion(person, params.id, params.number, body.reason),
)
