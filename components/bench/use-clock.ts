'use client'

import { useEffect, useEffectEvent, useSyncExternalStore } from 'react'
import type { Clock } from '@/scene/session/clock'
import { useBench } from '@/scene/session/react'

/** Runs `move` at once and after every change of the clock. For DOM by reference: it must not set state. */
export function useClock(move: (clock: Clock) => void): void {
  const { clock } = useBench()
  const onMove = useEffectEvent(() => move(clock))
  useEffect(() => {
    onMove()
    return clock.subscribe(onMove)
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

export function useReducedMotion(): boolean {
  return useSyncExternalStore(
    (changed) => {
      const query = window.matchMedia(REDUCED)
      query.addEventListener('change', changed)
      return () => query.removeEventListener('change', changed)
    },
    () => window.matchMedia(REDUCED).matches,
    () => false,
  )
}

const REDUCED = '(prefers-reduced-motion: reduce)'

export const degrees = (angle: number) => (angle * 180) / Math.PI
export const radians = (angle: number) => (angle * Math.PI) / 180

/** Moves the clock to the next whole step in a direction, and stands still there. */
export function stepClock(clock: Clock, byDeg: number): void {
  clock.pause()
  const at = degrees(clock.angle)
  const size = Math.abs(byDeg)
  const snapped = Math.round((at + byDeg) / size) * size
  clock.setAngle(radians(Number(snapped.toFixed(4))))
}
