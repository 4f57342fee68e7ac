import { openVersionForReview as contract } from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { recordOpening } from '@/lib/services/reviews/record-opening'

export const POST = handle(contract, ({ person, params }) => recordOpening(person, params.id, params.number))
