'use client'

import { useRef, type KeyboardEvent, type PointerEvent } from 'react'

interface Props {
  label: string
  /** 0 … 1 along the rule. */
  at: number
  valueText: string
  value: number
  min: number
  max: number
  /** Graduations, 0 … 1: long ones and short ones. */
  long: number[]
  short: number[]
  onMove(at: number): void
  onStep(by: number): void
}

const LENGTH = 142

/** A slider drawn as a steel rule: a datum triangle on graduations. */
export function SliderRule({ label, at, value, valueText, min, max, long, short, onMove, onStep }: Props) {
  const rule = useRef<SVGSVGElement>(null)
  const x = (share: number) => 1 + share * (LENGTH - 2)
  const drag = (event: PointerEvent) => {
    if (event.type === 'pointerdown') event.currentTarget.setPointerCapture(event.pointerId)
    else if (event.buttons === 0) return
    const box = rule.current!.getBoundingClientRect()
    const share = ((event.clientX - box.left) / box.width) * LENGTH - 1
    onMove(Math.min(1, Math.max(0, share / (LENGTH - 2))))
  }
  const step = (event: KeyboardEvent) => {
    const by = {
      ArrowRight: 1,
      ArrowUp: 1,
      ArrowLeft: -1,
      ArrowDown: -1,
      PageUp: 5,
      PageDown: -5,
      Home: -1e6,
      End: 1e6,
    }[event.key]
    if (by === undefined) return
    event.preventDefault()
    onStep(by)
  }
  return (
    <svg
      ref={rule}
      className="dr rule"
      viewBox={`0 0 ${LENGTH} 24`}
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={min}
      aria-valuemax={max}
      aria-valuenow={value}
      aria-valuetext={valueText}
      onPointerDown={drag}
      onPointerMove={drag}
      onKeyDown={step}
    >
      <path className="axis" d={`M1 11H${LENGTH - 1}`} />
      <path
        className="rt"
        d={[...long.map((s) => `M${x(s)} 11v8`), ...short.map((s) => `M${x(s)} 11v4`)].join('')}
      />
      <path className="curtri" d={`M${x(at)} 11l-6 -9h12z`} />
    </svg>
  )
}
