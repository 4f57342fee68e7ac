import type { LayoutProgress, LayoutSearch } from '@/lib/mechanics/layouts/find-layouts'
import type { LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { runSearch, type SearchControl } from './run-search'

/** The layout finder in a worker of its own. */
export const searchLayouts = (request: LayoutRequest, control: SearchControl<LayoutProgress>) =>
  runSearch<LayoutRequest, LayoutSearch, LayoutProgress>(
    new Worker(new URL('./layouts-worker.ts', import.meta.url), { type: 'module' }),
    request,
    control,
  )
