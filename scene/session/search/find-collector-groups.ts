import type { CollectorGroupings } from '@/lib/mechanics/collector-groups'
import type { PulseWindow } from '@/lib/mechanics/exhaust-pulses'
import type { Train } from '@/lib/mechanics/train'
import { runSearch, type SearchControl } from './run-search'

export interface CollectorGroupsRequest {
  train: Train
  count: number
  window: PulseWindow
}

/** The best groupings of a train's cylinders into collectors, found in a worker. */
export const findCollectorGroups = (
  request: CollectorGroupsRequest,
  control: SearchControl<number>,
): Promise<CollectorGroupings> =>
  runSearch(
    new Worker(new URL('./collector-groups-worker.ts', import.meta.url), { type: 'module' }),
    request,
    control,
  )
