'use client'

import { useEffect, useId, useMemo, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react'
import { formatNumber } from '@/lib/units/format'
import { parseQuantity } from '@/lib/units/parse'
import { stripLayout } from '@/scene/frame/strip-layout'
import type { CrankTrain } from '@/scene/model/crank-train'
import type { Clock } from '@/scene/session/clock'
import type { Forces } from '@/scene/stage/types'
import { degrees, radians, stepClock, useClockMoves } from './clock-moves'
import { StripDrawing, type StripPressures } from './strip-drawing'

interface Props {
  clock: Clock
  train: CrankTrain
  forces: Pick<Forces, 'events' | 'plan'>
  pressures?: StripPressures | null
}

/**
 * The cycle as a strip: a lane a cylinder, intervals as chain dimensions, graduated like a rule. Its cursor is the
 * crank angle: drag, click, arrow keys and typing are equal.
 */
export function FiringStrip({ clock, train, forces, pressures = null }: Props) {
  const host = useRef<HTMLDivElement>(null)
  const slider = useRef<HTMLDivElement>(null)
  const flag = useRef<HTMLInputElement>(null)
  const [width, setWidth] = useState(872)
  const id = useId()
  const cycleDeg = train.cycle === 'two-stroke' ? 360 : 720
  const layout = useMemo(() => {
    const { cylinders } = forces.plan.train
    const events = forces.events.map(({ cylinder, angle }) => ({
      id: cylinders[cylinder].id,
      at: degrees(angle),
    }))
    return stripLayout({ train, events, cycleDeg, width })
  }, [train, forces, cycleDeg, width])
  const span = layout.right - layout.left

  useEffect(() => {
    const observer = new ResizeObserver(([entry]) => setWidth(Math.round(entry.contentRect.width)))
    observer.observe(host.current!)
    return () => observer.disconnect()
  }, [])

  const place = (angleDeg: number) => {
    const x = layout.left + (angleDeg / cycleDeg) * span
    const text = `${angleDeg.toFixed(1)}°`
    slider.current?.style.setProperty('transform', `translateX(${x}px)`)
    if (flag.current) {
      const at = Math.min(Math.max(x, 30), width - 30)
      flag.current.style.setProperty('transform', `translateX(${at - 29}px)`)
      if (document.activeElement !== flag.current) flag.current.value = text
    }
    if (!clock.playing && slider.current) {
      slider.current.setAttribute('aria-valuenow', angleDeg.toFixed(1))
      slider.current.setAttribute('aria-valuetext', `${angleDeg.toFixed(1)} degrees`)
    }
  }
  useClockMoves(clock, () => place(degrees(clock.angle)))
  useEffect(() => place(degrees(clock.angle)))

  const standAt = (angleDeg: number) => {
    clock.pause()
    clock.setAngle(radians(angleDeg))
  }
  const drag = (event: PointerEvent) => {
    if (event.target === flag.current) return
    if (event.type === 'pointerdown') {
      event.currentTarget.setPointerCapture(event.pointerId)
      slider.current?.focus({ preventScroll: true })
    } else if (event.buttons === 0) return
    const box = host.current!.getBoundingClientRect()
    const share = Math.min(1, Math.max(0, (event.clientX - box.left - layout.left) / span))
    // The last point of the rule is the first of the next cycle.
    standAt(Math.min(Number((share * cycleDeg).toFixed(1)), cycleDeg - 0.1))
  }
  const key = (event: KeyboardEvent) => {
    const fine = event.shiftKey ? 0.1 : 1
    const by = {
      ArrowRight: fine,
      ArrowUp: fine,
      ArrowLeft: -fine,
      ArrowDown: -fine,
      PageUp: 10,
      PageDown: -10,
    }[event.key]
    if (by) stepClock(clock, by)
    else if (event.key === 'Home') standAt(0)
    else if (event.key === 'End') standAt(cycleDeg - 1)
    else if (event.key === ' ') {
      if (clock.playing) clock.pause()
      else clock.play()
    } else return
    event.preventDefault()
  }
  const type = (text: string) => {
    const parsed = parseQuantity(text, 'angle', '°')
    if (!parsed.ok) return
    standAt(degrees(parsed.value))
  }

  return (
    <div
      className="lanes"
      ref={host}
      style={{ minHeight: layout.height }}
      onPointerDown={drag}
      onPointerMove={drag}
    >
      <StripDrawing {...{ layout, width, cycleDeg, clock, forces, pressures }} />
      <div
        ref={slider}
        className="strip-cursor"
        role="slider"
        tabIndex={0}
        aria-label="Crank angle"
        aria-valuemin={0}
        aria-valuemax={cycleDeg}
        aria-valuenow={0}
        style={{ top: 22, height: layout.rule - 22 }}
        onKeyDown={key}
      />
      <input
        ref={flag}
        id={`${id}-angle`}
        className="strip-flag fig"
        aria-label="Crank angle, degrees"
        defaultValue={`${formatNumber(degrees(clock.angle), { decimals: 1 })}°`}
        onFocus={(event) => {
          clock.pause()
          event.target.select()
        }}
        onChange={(event) => type(event.target.value)}
        onKeyDown={(event) => {
          if (event.key === 'Enter') event.currentTarget.blur()
        }}
        onBlur={(event) => {
          event.target.value = `${degrees(clock.angle).toFixed(1)}°`
        }}
      />
    </div>
  )
}
