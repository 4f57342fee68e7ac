import { rankFiringOrders, type RankedOrders } from '@/lib/mechanics/firing-ranking'
import type { FiringOrdersRequest } from './find-firing-orders'
import { serveSearch } from './serve-search'

serveSearch<FiringOrdersRequest, RankedOrders>(({ train, even }, onProgress) => {
  const search = rankFiringOrders(train, { even })
  for (;;) {
    const step = search.next()
    if (step.done) return step.value
    onProgress(step.value)
  }
})
