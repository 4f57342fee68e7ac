import { useEffect, useEffectEvent } from 'react'
import type { Clock } from '@/scene/session/clock'

export const degrees = (angle: number) => (angle * 180) / Math.PI
export const radians = (angle: number) => (angle * Math.PI) / 180

/** Runs `move` at once and after every change of the clock. For DOM by reference: it must not set state. */
export function useClockMoves(clock: Clock, move: () => void): void {
  const onMove = useEffectEvent(move)
  useEffect(() => {
    onMove()
    return clock.subscribe(onMove)
  }, [clock])
}

/** Moves the clock to the next whole step in a direction, and stands still there. */
export function stepClock(clock: Clock, byDeg: number): void {
  clock.pause()
  const at = degrees(clock.angle)
  const size = Math.abs(byDeg)
  const snapped = Math.round((at + byDeg) / size) * size
  clock.setAngle(radians(Number(snapped.toFixed(4))))
}
