import { findLayouts, type LayoutProgress, type LayoutSearch } from '@/lib/mechanics/layouts/find-layouts'
import type { LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { serveSearch } from './serve-search'

/** Enough for every search that ends within some seconds. */
const MOST_PHASINGS = 3_000_000

serveSearch<LayoutRequest, LayoutSearch, LayoutProgress>((request, onProgress) => {
  const steps = findLayouts(request, { mostPhasings: MOST_PHASINGS })
  for (;;) {
    const step = steps.next()
    if (step.done) return step.value
    onProgress(step.value)
  }
})
