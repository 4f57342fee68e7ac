'use client'

import { useMemo } from 'react'
import type { Table } from '@/lib/tables/table'
import { ChartFrame } from './chart-frame'
import { Plot, plotArea } from './plot-area'
import type { Axis, ChartProps } from './types'

/** What a point means, told by its shape. */
export type Shape = 'ring' | 'dot' | 'diamond' | 'square' | 'cross'

interface Props extends ChartProps {
  x: Axis
  y: Axis
  points: { name: string; x: number; y: number; shape: Shape }[]
  /** What each shape means. */
  shapes: Partial<Record<Shape, string>>
  chosen?: number | null
  height?: number
}

const forms: Record<Shape, string> = {
  ring: 'M-4 0a4 4 0 1 0 8 0a4 4 0 1 0-8 0Z',
  dot: 'M-3.4 0a3.4 3.4 0 1 0 6.8 0a3.4 3.4 0 1 0-6.8 0Z',
  diamond: 'M0-5l5 5-5 5-5-5Z',
  square: 'M-3.8-3.8h7.6v7.6h-7.6Z',
  cross: 'M-4-4l8 8M4-4l-8 8',
}

/** One point a choice, over two figures of it. */
export function ScatterChart(props: Props) {
  const { x, y, points, shapes, chosen = null, height = 320 } = props
  const table = useMemo<Table>(
    () => ({
      title: props.title,
      columns: [
        { name: 'Point', unit: '' },
        { name: x.name, unit: x.unit, si: x.si },
        { name: y.name, unit: y.unit, si: y.si },
        { name: 'Kind', unit: '' },
      ],
      rows: points.map((point) => [point.name, point.x, point.y, shapes[point.shape] ?? '']),
    }),
    [props.title, x, y, points, shapes],
  )
  const over = (of: 'x' | 'y') => ({
    from: Math.min(0, ...points.map((point) => point[of])),
    to: Math.max(1e-9, ...points.map((point) => point[of])) * 1.04,
  })
  return (
    <>
      <ChartFrame {...props} table={table}>
        {(width) => {
          const plot = plotArea(width, height, over('x'), over('y'))
          return {
            height,
            points: {
              count: points.length,
              place: (i) => ({ x: plot.x(points[i].x), y: plot.y(points[i].y) }),
              words: (i) =>
                `${points[i].name}: ${x.name} ${x.format(points[i].x)} ${x.unit}, ${y.name} ${y.format(points[i].y)} ${y.unit}`,
            },
            picture: (
              <Plot area={plot} x={x} y={y}>
                {points.map((point, i) => (
                  <path
                    key={point.name}
                    className={`spot ${point.shape}${i === chosen ? ' on' : ''}`}
                    transform={`translate(${plot.x(point.x)} ${plot.y(point.y)})`}
                    d={forms[point.shape]}
                  />
                ))}
              </Plot>
            ),
          }
        }}
      </ChartFrame>
      <p className="cap shapes">
        {Object.entries(shapes).map(([shape, words]) => (
          <span key={shape}>
            <svg viewBox="-7 -7 14 14" width="14" height="14" aria-hidden="true">
              <path className={`spot ${shape}`} d={forms[shape as Shape]} />
            </svg>
            {words}
          </span>
        ))}
      </p>
    </>
  )
}
