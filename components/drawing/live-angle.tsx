'use client'

import { useRef } from 'react'
import type { Clock } from '@/scene/session/clock'
import { degrees, useClockMoves } from './clock-moves'

/** The crank angle in words, written by reference while the engine runs. */
export function LiveAngle({ clock }: { clock: Clock }) {
  const words = useRef<HTMLSpanElement>(null)
  useClockMoves(clock, () => {
    if (words.current) words.current.textContent = `${degrees(clock.angle).toFixed(1)}°`
  })
  return <span ref={words} className="fig" />
}
