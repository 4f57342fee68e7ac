import { restoreVersion as contract } from '@/lib/contracts/versions'
import { handle } from '@/lib/http/handle'
import { restoreVersion } from '@/lib/services/restore-version'

export const POST = handle(contract, ({ person, params, body, idempotencyKey }) =>
  restoreVersion(person, params.id, params.number, body, idempotencyKey),
)
