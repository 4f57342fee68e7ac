import { listReviews as contract } from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { listReviews } from '@/lib/services/reviews/list-reviews'

export const GET = handle(contract, ({ person, query }) => listReviews(person, query))
