import { countOpening as contract } from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { countOpening } from '@/lib/services/count-opening'

export const POST = handle(contract, ({ params }) => countOpening(params.token))
