import { balanceOrders as contract } from '@/lib/contracts/balance'
import { handle } from '@/lib/http/handle'
import { balanceOrders } from '@/lib/services/balance-orders'

export const POST = handle(contract, async ({ body }) => balanceOrders(body))
