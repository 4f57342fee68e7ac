import { designBalanceShafts as contract } from '@/lib/contracts/balance'
import { handle } from '@/lib/http/handle'
import { designBalanceShafts } from '@/lib/services/balance-orders'

export const POST = handle(contract, async ({ body }) => designBalanceShafts(body))
