import type { RankedOrders } from '@/lib/mechanics/firing-ranking'
import type { Train } from '@/lib/mechanics/train'
import { runSearch, type SearchControl } from './run-search'

export interface FiringOrdersRequest {
  train: Train
  even: boolean
}

/** The ranked legal orders of a train, found in a worker; progress is how many orders were seen. */
export const findFiringOrders = (
  request: FiringOrdersRequest,
  control: SearchControl<number>,
): Promise<RankedOrders> =>
  runSearch(
    new Worker(new URL('./firing-orders-worker.ts', import.meta.url), { type: 'module' }),
    request,
    control,
  )
