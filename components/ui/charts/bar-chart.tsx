'use client'

import { useMemo } from 'react'
import type { Table } from '@/lib/tables/table'
import { ChartFrame } from './chart-frame'
import { Plot, plotArea } from './plot-area'
import type { Axis, ChartProps } from './types'

interface Props extends ChartProps {
  x: Axis
  y: Axis
  bars: { x: number; y: number; /** Stands out by a diamond above it, and in words. */ mark?: string }[]
  chosen?: number | null
  height?: number
}

/** One bar a place: harmonics, counts. */
export function BarChart(props: Props) {
  const { x, y, bars, chosen = null, height = 220 } = props
  const table = useMemo<Table>(() => {
    const marked = bars.some(({ mark }) => mark)
    return {
      title: props.title,
      columns: [
        { name: x.name, unit: x.unit, si: x.si },
        { name: y.name, unit: y.unit, si: y.si },
        ...(marked ? [{ name: 'Remark', unit: '' }] : []),
      ],
      rows: bars.map((bar) => [bar.x, bar.y, ...(marked ? [bar.mark ?? ''] : [])]),
    }
  }, [props.title, x, y, bars])
  const step = bars.length > 1 ? bars[1].x - bars[0].x : 1
  const spanX = { from: bars[0].x - step, to: bars[bars.length - 1].x + step }
  const spanY = {
    from: Math.min(0, ...bars.map((bar) => bar.y)),
    to: Math.max(0, ...bars.map((bar) => bar.y)),
  }
  return (
    <ChartFrame {...props} table={table} along>
      {(width) => {
        const plot = plotArea(width, height, spanX, spanY)
        const half = Math.max(2, Math.min(9, (plot.x(step) - plot.x(0)) * 0.32))
        return {
          height,
          points: {
            count: bars.length,
            place: (i) => ({ x: plot.x(bars[i].x), y: plot.y(bars[i].y) }),
            words: (i) =>
              [`${x.name} ${x.format(bars[i].x)}: ${y.format(bars[i].y)} ${y.unit}`.trim(), bars[i].mark]
                .filter(Boolean)
                .join(', '),
          },
          picture: (
            <Plot area={plot} x={x} y={y}>
              {bars.map((bar, i) => {
                const [at, top] = [plot.x(bar.x), plot.y(bar.y)]
                return (
                  <g key={bar.x} className={i === chosen ? 'bar on' : 'bar'}>
                    <path d={`M${at - half} ${plot.y(0)}V${top}h${2 * half}V${plot.y(0)}`} />
                    {bar.mark ? <path className="bar-mark" d={`M${at} ${top - 13}l4 4-4 4-4-4Z`} /> : null}
                  </g>
                )
              })}
            </Plot>
          ),
        }
      }}
    </ChartFrame>
  )
}
