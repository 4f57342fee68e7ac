import { scaleLinear, scaleLog, type ScaleContinuousNumeric } from 'd3-scale'
import type { ReactNode } from 'react'
import type { Axis } from './types'

export interface Span {
  from: number
  to: number
  /** Where an axis must be divided, instead of where it comes out round. */
  at?: number[]
  log?: boolean
}

export interface PlotArea {
  x: ScaleContinuousNumeric<number, number>
  y: ScaleContinuousNumeric<number, number>
  left: number
  right: number
  top: number
  bottom: number
}

const LEFT = 46
const TOP = 22

/** Places a plot in a drawing: room left for figures, above for the name of y, below for the name of x. */
export function plotArea(width: number, height: number, x: Span, y: Span, rightRoom = 14): PlotArea {
  const [left, right, top, bottom] = [LEFT, width - rightRoom, TOP, height - 34]
  return { x: scaled(x, left, right, false), y: scaled(y, bottom, top, !y.at), left, right, top, bottom }
}

function scaled({ from, to, log }: Span, start: number, end: number, round: boolean) {
  const span = to > from ? [from, to] : [from - (Math.abs(from) || 1), from + (Math.abs(from) || 1)]
  const scale = (log ? scaleLog() : scaleLinear()).domain(span).range([start, end])
  return round ? scale.nice(5) : scale
}

interface Props {
  area: PlotArea
  x: Axis
  y: Axis
  xAt?: number[]
  yAt?: number[]
  children: ReactNode
}

/** Grid, axes with their names and units, and what stands in them. */
export function Plot({ area, x, y, xAt, yAt, children }: Props) {
  const { left, right, top, bottom } = area
  const across = xAt ?? area.x.ticks(Math.max(2, Math.round((right - left) / 90)))
  const up = yAt ?? area.y.ticks(Math.max(2, Math.round((bottom - top) / 34)))
  return (
    <>
      <text className="t xs" x={2} y={12}>
        {named(y)}
      </text>
      {up.map((value) => (
        <g key={value}>
          <path className="grid" d={`M${left} ${area.y(value)}H${right}`} />
          <text className="t fig xs" x={left - 6} y={area.y(value) + 3.8} textAnchor="end">
            {y.format(value)}
          </text>
        </g>
      ))}
      {across.map((value) => (
        <g key={value}>
          <path className="axis" d={`M${area.x(value)} ${bottom}v4`} />
          <text className="t fig xs" x={area.x(value)} y={bottom + 16} textAnchor="middle">
            {x.format(value)}
          </text>
        </g>
      ))}
      <text className="t xs" x={right} y={bottom + 30} textAnchor="end">
        {named(x)}
      </text>
      <path className="axis" d={`M${left} ${top}V${bottom}H${right}`} />
      {isWithin(0, area.y.domain()) ? <path className="axis" d={`M${left} ${area.y(0)}H${right}`} /> : null}
      {children}
    </>
  )
}

const named = ({ name, unit }: Axis) => (unit === '' ? name : `${name}, ${unit}`)

const isWithin = (value: number, [from, to]: number[]) => from < value && value < to
