'use client'

import { useEffect, useEffectEvent, useMemo } from 'react'
import type { Instant } from '@/lib/mechanics/instant'
import { buildInstant, fillInstant } from '@/lib/mechanics/plan'
import { useBench, useResults } from '@/scene/session/react'

/**
 * Runs `write` at once and whenever the clock moves, with everything the kernel knows of that angle. For DOM by
 * reference: it must not set state.
 */
export function useInstant(write: (instant: Instant) => void): void {
  const { clock } = useBench()
  const { plan } = useResults().model
  const instant = useMemo(() => buildInstant(plan), [plan])
  const onMove = useEffectEvent(() => {
    fillInstant(instant, plan, clock.angle)
    write(instant)
  })
  useEffect(() => {
    onMove()
    return clock.subscribe(onMove)
  }, [clock, plan])
  // What is written may also depend on props of the component that asks.
  useEffect(() => onMove())
}
