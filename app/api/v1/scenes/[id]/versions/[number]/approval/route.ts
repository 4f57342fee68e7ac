import { readApproval as contract } from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { readApproval } from '@/lib/services/reviews/read-approval'

export const GET = handle(contract, ({ person, params }) => readApproval(person, params.id, params.number))
