import * as contracts from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { askReview } from '@/lib/services/reviews/ask-review'
import { callOffReview } from '@/lib/services/reviews/call-off-review'
import { readReview } from '@/lib/services/reviews/read-review'

export const GET = handle(contracts.readReview, ({ person, params }) =>
  readReview(person, params.id, params.number),
)

export const POST = handle(contracts.askReview, ({ person, params, body, idempotencyKey }) =>
  askReview(person, params.id, params.number, body, idempotencyKey),
)

export const DELETE = handle(contracts.callOffReview, ({ person, params }) =>
  callOffReview(person, params.id, params.number),
)
