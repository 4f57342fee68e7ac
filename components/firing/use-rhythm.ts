'use client'

import { useEffect, useRef, type RefObject } from 'react'
import { createClickTrack, type ClickTrack } from './click-track'
import type { Beat } from './rhythm'
import type { MarksHandle } from './rhythm-marks'

/** Where the crank is, rad, and how fast it turns, rad/s, so many seconds after the rhythm began. */
export type Pace = (seconds: number) => { angle: number; rate: number }

interface Rhythm {
  on: boolean
  beats: readonly Beat[]
  cycle: number
  volume: number
  pace: Pace
  marks: RefObject<MarksHandle | null>
}

/** Milliseconds between two looks at the crank. */
const LOOK = 50

/** Clicks and marks while it is on, until the leaf closes. */
export function useRhythm({ on, beats, cycle, volume, pace, marks }: Rhythm) {
  const track = useRef<ClickTrack | null>(null)
  const loud = useRef(volume)

  useEffect(() => {
    loud.current = volume
    track.current?.setVolume(volume)
  }, [volume])

  useEffect(() => {
    if (!on) return
    const clicks = createClickTrack(beats, cycle, loud.current)
    track.current = clicks
    const shown = marks.current
    const start = performance.now()
    const look = () => {
      const { angle, rate } = pace((performance.now() - start) / 1000)
      clicks?.follow(angle, rate)
      shown?.show(angle, rate, cycle)
    }
    look()
    const timer = setInterval(look, LOOK)
    return () => {
      clearInterval(timer)
      clicks?.stop()
      track.current = null
      shown?.rest()
    }
  }, [on, beats, cycle, pace, marks])
}
