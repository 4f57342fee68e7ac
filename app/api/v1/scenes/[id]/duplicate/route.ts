import { duplicateScene as contract } from '@/lib/contracts/scenes'
import { handle } from '@/lib/http/handle'
import { duplicateScene } from '@/lib/services/duplicate-scene'

export const POST = handle(contract, ({ person, params, body, idempotencyKey }) =>
  duplicateScene(person, params.id, body, idempotencyKey),
)
