'use client'

import { line } from 'd3-shape'
import { useEffect, useMemo, useRef } from 'react'
import type { Table } from '@/lib/tables/table'
import { ChartFrame } from './chart-frame'
import { Line } from './line'
import { Names, roomFor } from './names'
import { Plot, plotArea, type PlotArea, type Span } from './plot-area'
import type { Axis, ChartProps, Look } from './types'

export interface Series {
  name: string
  look: Look
  ys: ArrayLike<number>
  /** Its own places, where it does not share those of the chart. */
  xs?: ArrayLike<number>
}

interface Props extends ChartProps {
  x: Axis & { values: ArrayLike<number>; span?: Partial<Span>; log?: boolean }
  y: Axis & { span?: Partial<Span>; log?: boolean; /** The axis need not show zero. */ free?: boolean }
  series: Series[]
  /** A signal over a cycle: the line runs on to the end of the span, where it meets its beginning. */
  cyclic?: boolean
  height?: number
  marks?: { x: number; y: number; text: string }[]
  /** Upright lines with a name: a red line, a present speed. */
  rulers?: { x: number; text: string }[]
  /** Calls back with the x that the cursor stands at, whenever it moves. Returns how to stop. */
  follow?(move: (x: number) => void): () => void
}

/** Lines over x. The cursor is moved by reference, never through React. */
export function LineChart(props: Props) {
  const { x, y, series, cyclic, height = props.compact ? 112 : 240, marks = [], rulers = [], follow } = props
  const area = useRef<PlotArea | null>(null)
  const cursor = useRef<SVGGElement>(null)
  const live = useRef<number>(null)
  const table = useMemo(() => tableOf(props.title, x, y, series), [props.title, x, y, series])
  useEffect(
    () =>
      follow?.((at) => {
        live.current = at
        cursor.current?.setAttribute('transform', `translate(${area.current?.x(at) ?? 0} 0)`)
      }),
    [follow],
  )
  const xs = x.values
  const spanX: Span = {
    from: x.span?.from ?? Math.min(...series.map((one) => extent(one.xs ?? xs)[0])),
    to: x.span?.to ?? Math.max(...series.map((one) => extent(one.xs ?? xs)[1])),
    at: x.span?.at,
    log: x.log,
  }
  const seen = series.map(({ ys }) => extent(ys))
  const zero = y.log || y.free ? [] : [0]
  const spanY: Span = {
    from: y.span?.from ?? Math.min(...zero, ...seen.map(([low]) => low)),
    to: y.span?.to ?? Math.max(...zero, ...seen.map(([, high]) => high)),
    at: y.span?.at,
    log: y.log,
  }
  const named = series.length > 1
  const rightRoom = named ? roomFor(series.map(({ name }) => name)) : 18

  return (
    <ChartFrame {...props} table={table} along={series.every((one) => !one.xs)}>
      {(width) => {
        const plot = plotArea(width, height, spanX, spanY, rightRoom)
        area.current = plot
        const path = (one: Series) => {
          const across = one.xs ?? xs
          const at = thinned(one.ys.length)
          const points = at.map((i): [number, number] => [plot.x(across[i]), plot.y(one.ys[i])])
          if (cyclic) points.push([plot.x(spanX.to), plot.y(one.ys[0])])
          return line()(points) ?? ''
        }
        const first = series[0]
        return {
          height,
          points: first && {
            count: first.ys.length,
            place: (i) => ({ x: plot.x((first.xs ?? xs)[i]), y: plot.y(first.ys[i]) }),
            words: (i) => wordsAt(i, x, y, series),
          },
          picture: (
            <Plot area={plot} x={x} y={y} xAt={spanX.at} yAt={spanY.at}>
              {series.map((one) => (
                <Line key={one.name} look={one.look} path={path(one)} />
              ))}
              {named ? (
                <Names
                  x={plot.right}
                  top={plot.top}
                  bottom={plot.bottom}
                  ends={series.map(({ name, look, ys }) => ({
                    name,
                    look,
                    y: plot.y(cyclic ? ys[0] : ys[ys.length - 1]),
                  }))}
                />
              ) : null}
              {rulers.map(({ x: at, text }) => (
                <g key={text}>
                  <path className="meanl" d={`M${plot.x(at)} ${plot.top}V${plot.bottom}`} />
                  <text className="t sm halo-t" x={plot.x(at) + 4} y={plot.top + 10}>
                    {text}
                  </text>
                </g>
              ))}
              {marks.map((mark) => (
                <Mark key={mark.text} plot={plot} {...mark} />
              ))}
              {follow ? (
                <g
                  ref={cursor}
                  className="chart-cursor"
                  data-live
                  transform={`translate(${plot.x(live.current ?? spanX.from)} 0)`}
                >
                  <path className="cursor" d={`M0 ${plot.top - 2}V${plot.bottom}`} />
                  <path className="curtri" d={`M0 ${plot.bottom}l3.6 5h-7.2Z`} />
                </g>
              ) : null}
            </Plot>
          ),
        }
      }}
    </ChartFrame>
  )
}

function Mark({ plot, x, y, text }: { plot: PlotArea; x: number; y: number; text: string }) {
  const above = plot.y(y) - 6
  return (
    <>
      <circle className="mk" cx={plot.x(x)} cy={plot.y(y)} r="2.6" />
      <text
        className="t fig xs halo-t"
        x={Math.min(plot.right - 14, Math.max(plot.left + 14, plot.x(x)))}
        y={y < 0 || above < plot.top ? plot.y(y) + 14 : above}
        textAnchor="middle"
      >
        {text}
      </text>
    </>
  )
}

/** As many points as an eye can tell apart on a sheet. */
const FINEST = 720

function thinned(count: number): number[] {
  const stride = Math.max(1, Math.floor(count / FINEST))
  const at = Array.from({ length: Math.ceil(count / stride) }, (_, i) => i * stride)
  if (at.at(-1) !== count - 1) at.push(count - 1)
  return at
}

function extent(values: ArrayLike<number>): [number, number] {
  let [low, high] = [Infinity, -Infinity]
  for (let i = 0; i < values.length; i++) {
    if (values[i] < low) low = values[i]
    if (values[i] > high) high = values[i]
  }
  return [low, high]
}

function wordsAt(i: number, x: Axis & { values: ArrayLike<number> }, y: Axis, series: Series[]): string {
  const across = series[0].xs ?? x.values
  const read = series
    .filter((one) => !one.xs || one === series[0])
    .map(({ name, ys }) => `${series.length > 1 ? `${name} ` : ''}${y.format(ys[i])} ${y.unit}`.trim())
  return `${x.name} ${x.format(across[i])}${x.unit === '°' ? '°' : x.unit && ` ${x.unit}`}: ${read.join(', ')}`
}

function tableOf(title: string, x: Props['x'], y: Axis, series: Series[]): Table {
  const column = { name: x.name, unit: x.unit, si: x.si }
  if (series.some((one) => one.xs))
    return {
      title,
      columns: [{ name: 'Line', unit: '' }, column, { name: y.name, unit: y.unit, si: y.si }],
      rows: series.flatMap(({ name, ys, xs = x.values }) =>
        Array.from(ys, (value, i) => [name, xs[i], value]),
      ),
    }
  return {
    title,
    columns: [
      column,
      ...series.map(({ name }) => ({
        name: series.length > 1 ? `${y.name} ${name}` : y.name,
        unit: y.unit,
        si: y.si,
      })),
    ],
    rows: Array.from(x.values, (at, i) => [at, ...series.map(({ ys }) => ys[i])]),
  }
}
