import { proposePhasing } from '@/lib/contracts/firing'
import { handle } from '@/lib/http/handle'
import { proposePhasing as propose } from '@/lib/services/propose-phasing'

export const POST = handle(proposePhasing, async ({ body }) => propose(body))
