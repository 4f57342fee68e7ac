import { readEvidence as contract } from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { readEvidence } from '@/lib/services/reviews/read-evidence'

export const GET = handle(contract, ({ person, params }) => readEvidence(person, params.id, params.number))
