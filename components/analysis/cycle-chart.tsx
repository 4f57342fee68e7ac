'use client'

import { Chart, type ChartSeries } from '@/components/ui/chart'
import { formatNumber } from '@/lib/units/format'
import { scaleFor, type Quantity } from '@/lib/units/quantities'
import { units } from '@/lib/units/units'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import { useCallback } from 'react'
import { largest, type Extreme } from './signal'

interface Props {
  name: string
  quantity: Quantity
  /** SI signals over one cycle. */
  series: ChartSeries[]
  /** Marked on the chart: a place on one of the signals. */
  peak?: Extreme
  height?: number
}

/** A signal over one cycle in the units of the sheet, with the cursor of the clock in it. */
export function CycleChart({ name, quantity, series, peak, height }: Props) {
  const { clock } = useBench()
  const { analysis, cycleDeg } = useResults()
  const system = useSessionState((state) => state.system)
  const top = Math.max(...series.map(({ values }) => largest(values)))
  const scale = scaleFor(top, quantity, system)
  const factor = units[scale.unit].factor
  const shown = series.map((one) => ({
    ...one,
    values: Float64Array.from(one.values, (value) => value / factor),
  }))
  const span = top / factor
  const decimals = span >= 20 ? 0 : span >= 2 ? 1 : 2
  const format = (value: number) => formatNumber(value, { decimals })
  const follow = useCallback(
    (move: (x: number) => void) => {
      const show = () => move((clock.angle * 180) / Math.PI)
      show()
      return clock.subscribe(show)
    },
    [clock],
  )
  const [main] = shown
  let low = main.values[0]
  let high = low
  for (const value of main.values) {
    if (value < low) low = value
    if (value > high) high = value
  }
  return (
    <Chart
      summary={`${name} over ${cycleDeg} degrees: ${series.length > 1 ? `${main.name} ` : ''}between ${format(low)} and ${format(high)} ${scale.unit}`}
      xs={analysis.angleDeg}
      xEnd={cycleDeg}
      xName="Crank angle"
      xUnit="°"
      yUnit={scale.unit}
      series={shown}
      height={height}
      format={format}
      mark={
        peak && {
          x: peak.at,
          y: peak.value / factor,
          text: formatNumber(peak.value / factor, { significant: 3 }),
        }
      }
      follow={follow}
    />
  )
}
