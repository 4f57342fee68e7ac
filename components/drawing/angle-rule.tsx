'use client'

import { useEffect, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react'
import type { Clock } from '@/scene/session/clock'

const degrees = 180 / Math.PI
/** Room for half a flag at either end. */
const margin = 26
const say = (angle: number) => `${(Math.round(angle * degrees * 10) / 10).toFixed(1)}°`

interface Props {
  clock: Clock
  events: { cylinder: number; angle: number }[]
  /** Where more than one stands on a page. */
  label?: string
  /** Cylinder names: the events then stand by name over the rule, with room for flags between, and the angle is read elsewhere. */
  names?: readonly string[]
}

/** Height of what stands over a rule with names. */
const roomForFlags = 30

/** A steel rule of one working cycle with the firing events on it; its cursor is the crank angle. */
export function AngleRule({ clock, events, label = 'Crank angle', names }: Props) {
  const rule = useRef<SVGSVGElement>(null)
  const cursor = useRef<SVGGElement>(null)
  const flag = useRef<SVGTextElement>(null)
  const [width, setWidth] = useState(600)
  const x = (angle: number) => (angle / clock.cycle) * width

  // Drawn at its width, so that its lettering keeps its size.
  useEffect(() => {
    const watch = new ResizeObserver(([entry]) =>
      setWidth(Math.max(120, Math.round(entry.contentRect.width) - 2 * margin)),
    )
    watch.observe(rule.current!)
    return () => watch.disconnect()
  }, [])

  useEffect(() => {
    const place = () => {
      const shown = say(clock.angle)
      cursor.current?.setAttribute('transform', `translate(${x(clock.angle).toFixed(2)} 0)`)
      if (flag.current) flag.current.textContent = shown
      rule.current?.setAttribute('aria-valuenow', (clock.angle * degrees).toFixed(1))
      rule.current?.setAttribute('aria-valuetext', shown)
    }
    place()
    return clock.subscribe(place)
  })

  const drag = (event: PointerEvent<SVGSVGElement>) => {
    if (event.type === 'pointerdown') event.currentTarget.setPointerCapture(event.pointerId)
    else if (!event.currentTarget.hasPointerCapture(event.pointerId)) return
    const box = event.currentTarget.getBoundingClientRect()
    const share = Math.min(0.999999, Math.max(0, (event.clientX - box.left - margin) / width))
    clock.pause()
    clock.setAngle(share * clock.cycle)
  }
  const key = (event: KeyboardEvent) => {
    const step = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1, PageUp: 10, PageDown: -10 }[
      event.key
    ]
    if (step === undefined && event.key !== 'Home') return
    event.preventDefault()
    clock.pause()
    clock.setAngle(step === undefined ? 0 : clock.angle + step / degrees)
  }

  const firingAt = names ? 12 - roomForFlags : 26
  const cycleDeg = Math.round(clock.cycle * degrees)
  const each = width < 420 ? 30 : 10
  const marks = Array.from({ length: cycleDeg / each + 1 }, (_, index) => index * each)
  return (
    <svg
      ref={rule}
      className="dr angle-rule"
      viewBox={
        names
          ? `${-margin} ${4 - roomForFlags} ${width + 2 * margin} ${52 + roomForFlags}`
          : `${-margin} 0 ${width + 2 * margin} 56`
      }
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={cycleDeg}
      aria-valuenow={0}
      onPointerDown={drag}
      onPointerMove={drag}
      onKeyDown={key}
    >
      <path className="rt" d={`M0 34H${width}`} />
      {marks.map((mark) => (
        <path
          key={mark}
          className="rt"
          d={`M${(mark / cycleDeg) * width} 34v${mark % 90 ? (mark % 30 ? 4 : 6) : 9}`}
        />
      ))}
      {marks
        .filter((mark) => mark % (cycleDeg / 4) === 0)
        .map((mark) => (
          <text key={mark} className="t fig xs" x={(mark / cycleDeg) * width} y={54} textAnchor="middle">
            {mark === cycleDeg ? `${mark}°` : mark}
          </text>
        ))}
      {names ? <path className="lane" d={`M0 ${firingAt}H${width}`} /> : null}
      {events.map((event) => (
        <g key={event.cylinder}>
          <path className="fire" d={`M${x(event.angle)} ${firingAt - 4.5}l4.5 4.5 -4.5 4.5 -4.5 -4.5z`} />
          {names ? (
            <text className="t fig sm" x={x(event.angle) + 8} y={firingAt + 4}>
              {names[event.cylinder]}
            </text>
          ) : null}
        </g>
      ))}
      <g ref={cursor}>
        <path className="cursor" d="M0 16V34" />
        <path className="curtri" d="M0 34l-5 8h10z" />
        {names ? null : (
          <>
            <path className="cflag" d="M-25 0h50v16h-50z" />
            <text ref={flag} className="t fig cft" x={0} y={12} textAnchor="middle" />
          </>
        )}
      </g>
    </svg>
  )
}
