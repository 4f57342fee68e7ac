'use client'

import { useCallback } from 'react'
import { LineChart } from '@/components/ui/charts/line-chart'
import type { Look } from '@/components/ui/charts/types'
import { formatNumber } from '@/lib/units/format'
import { scaleFor, type Quantity } from '@/lib/units/quantities'
import { units } from '@/lib/units/units'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import { fileUnit } from '@/lib/units/file-unit'
import { largest, type Extreme } from './signal'

interface Props {
  name: string
  quantity: Quantity
  /** SI signals over one cycle; the first is the one that is read. */
  series: { name: string; look: Look; values: ArrayLike<number> }[]
  /** Marked on the chart: a place on one of the signals. */
  peak?: Extreme
  height?: number
  /** On a leaf, where there is room. */
  wide?: boolean
}

/** A signal over one cycle in the units of the sheet, with the cursor of the clock in it. */
export function CycleChart({ name, quantity, series, peak, height, wide }: Props) {
  const { analysis, cycleDeg } = useResults()
  const system = useSessionState((state) => state.system)
  const follow = useCrankAngle()
  const top = Math.max(...series.map(({ values }) => largest(values)))
  const scale = scaleFor(top, quantity, system)
  const { factor } = units[scale.unit]
  const shown = series.map(({ values, ...one }) => ({
    ...one,
    ys: Float64Array.from(values, (value) => value / factor),
  }))
  const span = top / factor
  const decimals = span >= 20 ? 0 : span >= 2 ? 1 : 2
  const format = (value: number) => formatNumber(value, { decimals })
  const [main] = shown
  const low = Math.min(...main.ys)
  const high = Math.max(...main.ys)
  const quarters = [0, 1, 2, 3, 4].map((n) => (n * cycleDeg) / 4)
  return (
    <LineChart
      compact={!wide}
      title={name}
      sentence={`${name} over ${cycleDeg} degrees: ${series.length > 1 ? `${main.name} ` : ''}between ${format(low)} and ${format(high)} ${scale.unit}.`}
      x={{
        name: 'Crank angle',
        unit: '°',
        format: (value) => formatNumber(value, { decimals: 0 }),
        values: analysis.angleDeg,
        span: { from: 0, to: cycleDeg, at: quarters },
      }}
      y={{ name: quantityNames[quantity] ?? name, unit: scale.unit, format, si: fileUnit(scale.unit) }}
      series={shown}
      cyclic
      height={height}
      marks={
        peak && [
          {
            x: peak.at,
            y: peak.value / factor,
            text: formatNumber(peak.value / factor, { significant: 3 }),
          },
        ]
      }
      follow={follow}
    />
  )
}

const quantityNames: Partial<Record<Quantity, string>> = {
  force: 'Force',
  torque: 'Moment',
  length: 'Travel',
  velocity: 'Velocity',
  acceleration: 'Acceleration',
  pressure: 'Pressure',
  angle: 'Angle',
}

/** The crank angle of the clock in degrees, for the cursor of a chart. */
export function useCrankAngle(): (move: (angleDeg: number) => void) => () => void {
  const { clock } = useBench()
  return useCallback(
    (move) => {
      const show = () => move((clock.angle * 180) / Math.PI)
      show()
      return clock.subscribe(show)
    },
    [clock],
  )
}
