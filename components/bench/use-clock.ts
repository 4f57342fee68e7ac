'use client'

import { useEffect, useSyncExternalStore } from 'react'
import type { Clock } from '@/scene/session/clock'
import { useBench } from '@/scene/session/react'
import { pageTicker } from '@/scene/stage/ticker'

/** Keeps the clock going also where no drawing does: on the other leaves. */
export function useTicking(clock: Clock): void {
  useEffect(() => {
    const seat = pageTicker().join(clock, () => false)
    const stop = clock.subscribe(seat.wake)
    return () => {
      stop()
      seat.leave()
    }
  }, [clock])
}

/** Re-renders only when the clock starts or stops. */
export function usePlaying(): boolean {
  const { clock } = useBench()
  return useSyncExternalStore(
    clock.subscribe,
    () => clock.playing,
    () => false,
  )
}
