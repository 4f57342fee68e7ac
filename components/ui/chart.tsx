'use client'

import { useEffect, useId, useRef, useState } from 'react'
import { ticks } from './ticks'

export interface ChartSeries {
  name: string
  /** Its line in the sheet: `res` double, `gas` solid, `inertia` dashed, `v` plain ink. */
  look: 'res' | 'gas' | 'inertia' | 'v'
  values: ArrayLike<number>
}

interface Props {
  /** What it shows, for those who do not see it: "Turning moment over 720 degrees: …". */
  summary: string
  xs: ArrayLike<number>
  xEnd: number
  xName: string
  xUnit: string
  yUnit: string
  series: ChartSeries[]
  height?: number
  /** Most: marked with a ring and its figure. */
  mark?: { x: number; y: number; text: string }
  format(value: number): string
  /** Calls back with the x that the cursor stands at, whenever it moves. Returns how to stop. */
  follow?(move: (x: number) => void): () => void
}

const LEFT = 38
const TOP = 8

/**
 * A small line chart in the manner of the sheet, drawn at the width it has. The cursor is moved by reference, never
 * through React. A table of the same figures opens below it.
 */
export function Chart(props: Props) {
  const { summary, xs, xEnd, xName, xUnit, yUnit, series, height = 78, mark, format, follow } = props
  const id = useId()
  const host = useRef<HTMLDivElement>(null)
  const cursor = useRef<SVGGElement>(null)
  const [width, setWidth] = useState(260)
  const [table, setTable] = useState(false)
  const names = series.length > 1
  const right = names ? 54 : 14
  const span = Math.max(40, width - LEFT - right)
  const bottom = height - 18

  useEffect(() => {
    const observer = new ResizeObserver(([entry]) => setWidth(Math.round(entry.contentRect.width)))
    observer.observe(host.current!)
    return () => observer.disconnect()
  }, [])
  useEffect(
    () =>
      follow?.((x) => cursor.current?.setAttribute('transform', `translate(${LEFT + (x / xEnd) * span} 0)`)),
    [follow, xEnd, span],
  )

  let low = 0
  let high = 0
  for (const { values } of series)
    for (let i = 0; i < values.length; i++) {
      if (values[i] < low) low = values[i]
      if (values[i] > high) high = values[i]
    }
  const marks = ticks(low, high, height < 70 ? 2 : 3)
  const floor = marks[0]
  const roof = marks[marks.length - 1]
  const x = (value: number) => LEFT + (value / xEnd) * span
  const y = (value: number) => bottom - ((value - floor) / (roof - floor || 1)) * (bottom - TOP)
  const line = (values: ArrayLike<number>) => {
    const stride = Math.max(1, Math.floor(values.length / 360))
    let path = ''
    for (let i = 0; i < values.length; i += stride)
      path += `${path ? 'L' : 'M'}${x(xs[i]).toFixed(1)} ${y(values[i]).toFixed(1)}`
    return `${path}L${x(xEnd).toFixed(1)} ${y(values[0]).toFixed(1)}`
  }
  const quarter = xEnd / 4

  return (
    <figure className="chart" ref={host}>
      <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={summary}>
        {marks.map((value) => (
          <g key={value}>
            <path className="grid" d={`M${LEFT} ${y(value)}H${LEFT + span}`} />
            <text className="t fig xs" x={LEFT - 6} y={y(value) + 3.8} textAnchor="end">
              {format(value)}
            </text>
          </g>
        ))}
        {[0, 1, 2, 3, 4].map((n) => (
          <g key={n}>
            <path className="axis" d={`M${x(n * quarter)} ${bottom}v4`} />
            <text className="t fig xs" x={x(n * quarter)} y={bottom + 16} textAnchor="middle">
              {n * quarter}
              {n === 4 ? xUnit : ''}
            </text>
          </g>
        ))}
        <path className="axis" d={`M${LEFT} ${TOP}V${bottom}M${LEFT} ${bottom}H${LEFT + span}`} />
        {floor < 0 && roof > 0 ? <path className="axis" d={`M${LEFT} ${y(0)}H${LEFT + span}`} /> : null}
        {series.map(({ name, look, values }) => {
          const path = line(values)
          return (
            <g key={name}>
              <path className={`pl ${look}`} d={path} />
              {look === 'res' ? <path className="pl2" d={path} /> : null}
            </g>
          )
        })}
        {names
          ? nameHeights(
              series.map(({ values }) => y(values[0])),
              TOP + 6,
              bottom,
            ).map((at, i) => (
              <text key={series[i].name} className={`t sm c${series[i].look}`} x={LEFT + span + 4} y={at}>
                {series[i].name}
              </text>
            ))
          : null}
        {mark ? (
          <>
            <circle className="mk" cx={x(mark.x)} cy={y(mark.y)} r="2.6" />
            <text
              className="t fig xs halo-t"
              x={Math.min(LEFT + span - 14, Math.max(LEFT + 14, x(mark.x)))}
              y={mark.y < 0 ? y(mark.y) + 14 : Math.max(9, y(mark.y) - 6)}
              textAnchor="middle"
            >
              {mark.text}
            </text>
          </>
        ) : null}
        <g ref={cursor} className="chart-cursor" transform={`translate(${LEFT} 0)`}>
          <path className="cursor" d={`M0 ${TOP - 2}V${bottom}`} />
          <path className="curtri" d={`M0 ${bottom}l3.6 5h-7.2Z`} />
        </g>
      </svg>
      <button
        type="button"
        className="twin-button"
        aria-expanded={table}
        aria-controls={`${id}-twin`}
        onClick={() => setTable(!table)}
      >
        {table ? 'Hide table' : 'Table'}
      </button>
      {table ? (
        <TableTwin
          id={`${id}-twin`}
          caption={summary}
          head={[`${xName}, ${xUnit}`, ...series.map(({ name }) => `${name}, ${yUnit}`)]}
          rows={twinRows(xs, series, format)}
        />
      ) : null}
    </figure>
  )
}

/** Names stand at the height of their line's end, pushed apart to 14 px. */
function nameHeights(wanted: number[], top: number, bottom: number): number[] {
  const order = wanted.map((_, i) => i).sort((a, b) => wanted[a] - wanted[b])
  const placed = [...wanted]
  let least = top
  for (const i of order) {
    placed[i] = Math.max(least, Math.min(wanted[i] + 4, bottom - 2))
    least = placed[i] + 14
  }
  return placed
}

/** A line every 15 degrees or so: a table to read, not a dump. */
function twinRows(xs: ArrayLike<number>, series: ChartSeries[], format: (value: number) => string) {
  const stride = Math.max(1, Math.round(xs.length / 48))
  const rows: string[][] = []
  for (let i = 0; i < xs.length; i += stride)
    rows.push([String(xs[i]), ...series.map(({ values }) => format(values[i]))])
  return rows
}

function TableTwin({
  id,
  caption,
  head,
  rows,
}: {
  id: string
  caption: string
  head: string[]
  rows: string[][]
}) {
  return (
    <div className="twin" id={id} tabIndex={0}>
      <table className="tab">
        <caption className="vh">{caption}</caption>
        <thead>
          <tr>
            {head.map((name) => (
              <th key={name} className="r" scope="col">
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(([first, ...rest]) => (
            <tr key={first}>
              <th className="r fig" scope="row">
                {first}
              </th>
              {rest.map((cell, i) => (
                <td key={head[i + 1]} className="n">
                  {cell}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
