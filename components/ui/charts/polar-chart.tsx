'use client'

import { scaleLinear } from 'd3-scale'
import { line } from 'd3-shape'
import { useEffect, useMemo, useRef } from 'react'
import type { Table } from '@/lib/tables/table'
import { ChartFrame } from './chart-frame'
import { Line } from './line'
import { Names, roomFor } from './names'
import type { Axis, ChartProps, Look } from './types'

export interface Loop {
  name: string
  look: Look
  /** Components of the vector whose tip draws the loop; up and right on the sheet. */
  up: ArrayLike<number>
  right: ArrayLike<number>
}

interface Props extends ChartProps {
  /** What runs along the loops: the crank angle. */
  track: Axis & { values: ArrayLike<number> }
  size: Axis
  loops: Loop[]
  /** Words for the directions up, right, down and left. */
  directions: [string, string, string, string]
  /** Marked from the middle outward, angles clockwise from straight up, degrees. */
  sector?: { fromDeg: number; toDeg: number; name: string }
  marks?: { index: number; text: string }[]
  /** More words for a point that is read. */
  remark?(index: number): string
  /** Calls back with the index of the sample that the clock stands at. Returns how to stop. */
  follow?(move: (index: number) => void): () => void
  height?: number
}

/** The path of a vector's tip, with rings of equal size. The live point is moved by reference. */
export function PolarChart(props: Props) {
  const { track, size, loops, directions, sector, marks = [], remark, follow, height = 340 } = props
  const spot = useRef<SVGGElement>(null)
  const live = useRef(0)
  const toSheet = useRef<(index: number) => { x: number; y: number }>(null)
  const table = useMemo<Table>(
    () => ({
      title: props.title,
      columns: [
        { name: track.name, unit: track.unit, si: track.si },
        ...loops.flatMap(({ name }) => [
          { name: `${name} ${directions[0]}`, unit: size.unit, si: size.si },
          { name: `${name} ${directions[1]}`, unit: size.unit, si: size.si },
        ]),
      ],
      rows: Array.from(track.values, (at, i) => [at, ...loops.flatMap(({ up, right }) => [up[i], right[i]])]),
    }),
    [props.title, track, size, loops, directions],
  )
  useEffect(
    () =>
      follow?.((index) => {
        live.current = index
        const place = toSheet.current?.(index)
        if (place) spot.current?.setAttribute('transform', `translate(${place.x} ${place.y})`)
      }),
    [follow],
  )
  let most = 0
  for (const { up, right } of loops)
    for (let i = 0; i < up.length; i++) most = Math.max(most, Math.hypot(up[i], right[i]))
  const rings = scaleLinear()
    .domain([0, most || 1])
    .nice(3)
  const named = loops.length > 1 ? roomFor(loops.map(({ name }) => name)) : 0

  return (
    <ChartFrame {...props} table={table}>
      {(width) => {
        const middle = { x: (width - named) / 2, y: height / 2 }
        const room = Math.min(middle.x - 34, middle.y - 24)
        const scale = rings.range([0, room])
        const at = (up: number, right: number) => ({ x: middle.x + scale(right), y: middle.y - scale(up) })
        const path = ({ up, right }: Loop) => {
          const points = Array.from(up, (_, i): [number, number] => {
            const { x, y } = at(up[i], right[i])
            return [x, y]
          })
          return `${line()(points) ?? ''}Z`
        }
        const total = loops[loops.length - 1]
        toSheet.current = (i) => at(total.up[i], total.right[i])
        const stands = toSheet.current(Math.min(live.current, total.up.length - 1))
        const ends: [string, number, number, 'middle' | 'start' | 'end'][] = [
          [directions[0], middle.x, middle.y - room - 8, 'middle'],
          [directions[1], middle.x + room + 4, middle.y - 5, 'start'],
          [directions[2], middle.x, middle.y + room + 16, 'middle'],
          [directions[3], middle.x - room - 4, middle.y - 5, 'end'],
        ]
        return {
          height,
          points: {
            count: track.values.length,
            place: toSheet.current,
            words: (i) => [wordsAt(i, track, size, loops), remark?.(i)].filter(Boolean).join(', '),
          },
          picture: (
            <>
              {sector ? <Sector {...sector} {...middle} radius={room} /> : null}
              {rings
                .ticks(3)
                .slice(1)
                .map((value) => (
                  <g key={value}>
                    <circle className="grid" fill="none" cx={middle.x} cy={middle.y} r={scale(value)} />
                    <text
                      className="t fig xs halo-t"
                      x={middle.x - scale(value) * Math.SQRT1_2 - 3}
                      y={middle.y - scale(value) * Math.SQRT1_2 - 3}
                      textAnchor="end"
                    >
                      {size.format(value)}
                    </text>
                  </g>
                ))}
              <text className="t xs" x={2} y={12}>
                {`${size.name}, ${size.unit}`}
              </text>
              <path
                className="grid"
                d={`M${middle.x} ${middle.y - room}v${2 * room}M${middle.x - room} ${middle.y}h${2 * room}`}
              />
              {ends.map(([words, x, y, anchor]) => (
                <text key={words} className="t xs" x={x} y={y} textAnchor={anchor}>
                  {words}
                </text>
              ))}
              {loops.map((loop) => (
                <Line key={loop.name} look={loop.look} path={path(loop)} />
              ))}
              {loops.length > 1 ? (
                <Names
                  x={width - named}
                  top={10}
                  bottom={height - 10}
                  ends={loops.map(({ name, look }, i) => ({ name, look, y: 24 + 16 * i }))}
                />
              ) : null}
              {marks.map(({ index, text }) => {
                const { x, y } = at(total.up[index], total.right[index])
                return (
                  <g key={text}>
                    <circle className="mk" cx={x} cy={y} r="2.6" />
                    <text className="t fig xs halo-t" x={x + 6} y={y - 5}>
                      {text}
                    </text>
                  </g>
                )
              })}
              {follow ? (
                <g ref={spot} data-live transform={`translate(${stands.x} ${stands.y})`}>
                  <circle className="spot dot" r="4" />
                </g>
              ) : null}
            </>
          ),
        }
      }}
    </ChartFrame>
  )
}

interface SectorProps {
  fromDeg: number
  toDeg: number
  name: string
  x: number
  y: number
  radius: number
}

function Sector({ fromDeg, toDeg, name, x, y, radius }: SectorProps) {
  const tip = (deg: number, r = radius) => {
    const angle = (deg * Math.PI) / 180
    return `${(x + r * Math.sin(angle)).toFixed(1)} ${(y - r * Math.cos(angle)).toFixed(1)}`
  }
  const wide = (((toDeg - fromDeg) % 360) + 360) % 360
  const [labelX, labelY] = tip(fromDeg + wide / 2, radius * 0.72).split(' ')
  return (
    <>
      <path
        className="sector"
        d={`M${x} ${y}L${tip(fromDeg)}A${radius} ${radius} 0 ${wide > 180 ? 1 : 0} 1 ${tip(toDeg)}Z`}
      />
      <text className="t sm halo-t" x={labelX} y={labelY} textAnchor="middle">
        {name}
      </text>
    </>
  )
}

function wordsAt(i: number, track: Props['track'], size: Axis, loops: Loop[]): string {
  const read = loops.map(({ name, up, right }) => {
    const towards = (((Math.atan2(right[i], up[i]) * 180) / Math.PI + 360) % 360).toFixed(0)
    return `${name} ${size.format(Math.hypot(up[i], right[i]))} ${size.unit} towards ${towards}°`
  })
  return `${track.name} ${track.format(track.values[i])}${track.unit}: ${read.join(', ')}`
}
