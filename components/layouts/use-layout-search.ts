'use client'

import { useEffect, useRef, useState } from 'react'
import type { LayoutProgress, LayoutSearch } from '@/lib/mechanics/layouts/find-layouts'
import type { LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { searchLayouts } from '@/scene/session/search/search-layouts'

export type SearchState =
  { kind: 'idle' } | { kind: 'running'; seen: LayoutProgress } | { kind: 'cancelled' } | { kind: 'failed' }

/** One search at a time in a worker; leaving the page ends it. */
export function useLayoutSearch(onFound: (request: LayoutRequest, found: LayoutSearch) => void) {
  const [state, setState] = useState<SearchState>({ kind: 'idle' })
  const running = useRef<AbortController | null>(null)
  useEffect(() => () => running.current?.abort(), [])

  const begin = (request: LayoutRequest) => {
    running.current?.abort()
    const control = new AbortController()
    running.current = control
    const tell = (next: SearchState) => {
      if (running.current === control) setState(next)
    }
    tell({ kind: 'running', seen: { progress: 0, phasings: 0, orders: 0 } })
    searchLayouts(request, {
      signal: control.signal,
      onProgress: (seen) => tell({ kind: 'running', seen }),
    }).then(
      (found) => {
        if (running.current === control) onFound(request, found)
        tell({ kind: 'idle' })
      },
      () => tell({ kind: control.signal.aborted ? 'cancelled' : 'failed' }),
    )
  }
  return { state, begin, cancel: () => running.current?.abort() }
}
