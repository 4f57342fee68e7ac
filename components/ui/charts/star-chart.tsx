'use client'

import { useMemo } from 'react'
import type { Table } from '@/lib/tables/table'
import { ChartFrame } from './chart-frame'
import type { Axis, ChartProps } from './types'

interface Props extends ChartProps {
  size: Axis
  /** One arrow a phasor; angles clockwise from straight up, degrees. */
  arrows: { name: string; length: number; angleDeg: number }[]
  /** Their sum, drawn double. */
  sum?: { length: number; angleDeg: number }
  height?: number
}

/** Phasors as a star, and their sum. */
export function StarChart(props: Props) {
  const { size, arrows, sum, height = 240 } = props
  const table = useMemo<Table>(
    () => ({
      title: props.title,
      columns: [
        { name: 'Phasor', unit: '' },
        { name: size.name, unit: size.unit, si: size.si },
        { name: 'Angle', unit: '°' },
      ],
      rows: [
        ...arrows.map(({ name, length, angleDeg }) => [name, length, angleDeg]),
        ...(sum ? [['sum', sum.length, sum.angleDeg]] : []),
      ],
    }),
    [props.title, size, arrows, sum],
  )
  const most = Math.max(1e-12, ...arrows.map(({ length }) => length), sum?.length ?? 0)
  return (
    <ChartFrame {...props} table={table}>
      {(width) => {
        const [x, y] = [width / 2, height / 2]
        const room = Math.min(x, y) - 26
        const tip = (length: number, angleDeg: number, more = 0) => {
          const angle = (angleDeg * Math.PI) / 180
          const r = (length / most) * room + more
          return { x: x + r * Math.sin(angle), y: y - r * Math.cos(angle) }
        }
        return {
          height,
          points: {
            count: arrows.length,
            place: (i) => tip(arrows[i].length, arrows[i].angleDeg),
            words: (i) =>
              `${arrows[i].name}: ${size.format(arrows[i].length)} ${size.unit} at ${arrows[i].angleDeg.toFixed(0)}°`,
          },
          picture: (
            <>
              <circle className="grid" fill="none" cx={x} cy={y} r={room} />
              {together(arrows).map(({ names, length, angleDeg }) => {
                const end = tip(length, angleDeg)
                const label = tip(length, angleDeg, 13)
                return (
                  <g key={names.join()}>
                    <path className="pl v" d={`M${x} ${y}L${end.x} ${end.y}`} />
                    <path
                      className="curtri"
                      transform={`translate(${end.x} ${end.y}) rotate(${angleDeg})`}
                      d="M0 0l3 8h-6Z"
                    />
                    <text className="t fig xs halo-t" x={label.x} y={label.y + 4} textAnchor="middle">
                      {names.join('·')}
                    </text>
                  </g>
                )
              })}
              {sum && sum.length > 1e-9 * most ? (
                <>
                  <path
                    className="pl res"
                    d={`M${x} ${y}L${tip(sum.length, sum.angleDeg).x} ${tip(sum.length, sum.angleDeg).y}`}
                  />
                  <path
                    className="pl2"
                    d={`M${x} ${y}L${tip(sum.length, sum.angleDeg).x} ${tip(sum.length, sum.angleDeg).y}`}
                  />
                </>
              ) : (
                <circle className="mk" cx={x} cy={y} r="4" />
              )}
            </>
          ),
        }
      }}
    </ChartFrame>
  )
}

/** Phasors that lie on one another are one arrow with all their names. */
function together(arrows: Props['arrows']) {
  const groups: { names: string[]; length: number; angleDeg: number }[] = []
  for (const { name, length, angleDeg } of arrows) {
    const same = groups.find(
      (group) =>
        Math.abs(group.length - length) <= 1e-6 * Math.abs(length) &&
        Math.abs(((group.angleDeg - angleDeg + 540) % 360) - 180) < 0.05,
    )
    if (same) same.names.push(name)
    else groups.push({ names: [name], length, angleDeg })
  }
  return groups
}
