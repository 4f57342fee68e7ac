import { listFiringOrders } from '@/lib/contracts/firing'
import { handle } from '@/lib/http/handle'
import { listFiringOrders as list } from '@/lib/services/list-firing-orders'

export const POST = handle(listFiringOrders, async ({ body }) => list(body))
