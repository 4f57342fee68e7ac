import { bobWeightCard as contract } from '@/lib/contracts/balance'
import { handle } from '@/lib/http/handle'
import { bobWeightCard } from '@/lib/services/bob-weight-card'

export const POST = handle(contract, async ({ body }) => bobWeightCard(body))
