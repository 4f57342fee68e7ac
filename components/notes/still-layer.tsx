'use client'

import type { ReactNode } from 'react'
import type { StillDrawing } from '@/scene/model/still-drawing'
import type { Place, Shape } from './sketch'

/** Length of an arrow's head, in heights of the picture. */
const head = 0.028

/** Pencil over the still picture. It is as high as the picture is now, so that it lies where it was drawn. */
export function StillLayer({
  aspect,
  children,
  words,
}: {
  aspect: number
  children: ReactNode
  words?: string
}) {
  return (
    <svg
      className="still"
      viewBox={`0 0 ${aspect} 1`}
      style={{ aspectRatio: aspect }}
      {...(words ? { role: 'img', 'aria-label': `Drawn on the picture: ${words}` } : { 'aria-hidden': true })}
    >
      {children}
    </svg>
  )
}

export const StillDrawings = ({ drawings }: { drawings: readonly StillDrawing[] }) =>
  drawings.map((drawing, i) => (
    <StillLayer key={i} aspect={drawing.aspect} words={drawing.words}>
      {drawing.shapes.map((shape, k) => (
        <StillShape key={k} shape={shape} aspect={drawing.aspect} />
      ))}
    </StillLayer>
  ))

export function StillShape({ shape, aspect }: { shape: Shape; aspect: number }) {
  const at = ([x, y]: Place) => `${(x * aspect).toFixed(4)} ${y.toFixed(4)}`
  if (shape.shape === 'freehand')
    return <path className="still-line" d={`M${shape.points.map(at).join('L')}`} />
  const [x, y] = [shape.from[0] * aspect, shape.from[1]]
  const [toX, toY] = [shape.to[0] * aspect, shape.to[1]]
  if (shape.shape === 'box') return <path className="still-line" d={`M${x} ${y}H${toX}V${toY}H${x}Z`} />
  const angle = Math.atan2(toY - y, toX - x)
  const barb = (turn: number) =>
    `${(toX - head * Math.cos(angle + turn)).toFixed(4)} ${(toY - head * Math.sin(angle + turn)).toFixed(4)}`
  return (
    <path
      className="still-line"
      d={`M${at(shape.from)}L${at(shape.to)}M${barb(0.45)}L${at(shape.to)}L${barb(-0.45)}`}
    />
  )
}
