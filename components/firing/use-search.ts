'use client'

import { useCallback, useEffect, useRef, useState } from 'react'
import type { SearchControl } from '@/scene/session/search/run-search'

export type Begin<T> = (control: SearchControl<number>) => Promise<T>

export interface Search<T> {
  /** The last answer; of an earlier question while `state` is `running` or `stopped`. */
  answer: T | null
  state: 'running' | 'answered' | 'stopped' | 'failed'
  seen: number
  stop(): void
  again(): void
}

/** A search that runs whenever its question (the identity of `begin`) is a new one, and ends with the component. */
export function useSearch<T>(begin: Begin<T>): Search<T> {
  const [answer, setAnswer] = useState<T | null>(null)
  const [told, setTold] = useState<{ of: Begin<T> | null; state: Search<T>['state']; seen: number }>({
    of: null,
    state: 'running',
    seen: 0,
  })
  const running = useRef<AbortController | null>(null)

  const run = useCallback(() => {
    const control = new AbortController()
    running.current = control
    const tell = (state: Search<T>['state'], seen = 0) => {
      if (running.current === control) setTold({ of: begin, state, seen })
    }
    begin({ signal: control.signal, onProgress: (seen) => tell('running', seen) }).then(
      (found) => {
        if (running.current === control) setAnswer(found)
        tell('answered')
      },
      () => tell(control.signal.aborted ? 'stopped' : 'failed'),
    )
  }, [begin])

  useEffect(() => {
    run()
    return () => {
      const control = running.current
      running.current = null
      control?.abort()
    }
  }, [run])

  const current = told.of === begin
  return {
    answer,
    state: current ? told.state : 'running',
    seen: current ? told.seen : 0,
    stop: () => running.current?.abort(),
    again() {
      setTold({ of: begin, state: 'running', seen: 0 })
      run()
    },
  }
}
