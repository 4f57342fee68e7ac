'use client'

import { useMemo } from 'react'
import { LineChart, type Series } from '@/components/ui/charts/line-chart'
import { NEAR } from '@/lib/mechanics/torsion/critical-speeds'
import { nodesOf } from '@/lib/mechanics/torsion/shaft-modes'
import type { Train } from '@/lib/mechanics/train'
import { formatNumber } from '@/lib/units/format'
import { fromSi, toSi } from '@/lib/units/units'
import { useResults } from '@/scene/session/react'
import { orderText } from './order-text'
import { rpmText, shownOrders, spaced, speedRulers, strongest } from './torsion-words'
import type { Torsion } from './use-torsion'

/** More lines than these lie on one another; the table has the rest. */
const SHAPES = 3
const ORDERS = 5
/** Room for the figure of a mark, as a share of the axis. */
const LEAST_APART = 0.13

const hertzText = (frequency: number) => formatNumber(frequency, { decimals: 1 })
const hertz = (frequency: number) => frequency / (2 * Math.PI)

/** How the crank twists in its lowest modes, station by station. */
export function ModeShapes({ torsion: { modes, stations } }: { torsion: Torsion }) {
  const x = useMemo(() => {
    const values = stations.map((_, i) => i)
    return {
      name: 'Station',
      unit: '',
      // throws by their number alone: there is no room for more under the axis
      format: (value: number) => stations[value]?.replace(/^throw /, '') ?? '',
      values,
      span: { at: values },
    }
  }, [stations])
  const y = useMemo(
    () => ({
      name: 'Angle, the greatest 1',
      unit: '',
      format: (value: number) => formatNumber(value, { decimals: 2 }),
      span: { from: -1, to: 1 },
    }),
    [],
  )
  const series = useMemo(
    () =>
      modes
        .slice(0, SHAPES)
        .map(({ shape }, i): Series => ({ name: `mode ${i + 1}`, look: i === 0 ? 'v' : 'past', ys: shape })),
    [modes],
  )
  const [first] = modes
  const nodes = nodesOf(first.shape)
  return (
    <LineChart
      title="Mode shapes"
      sentence={`Mode 1 at ${hertzText(hertz(first.frequency))} Hz has ${nodes} ${nodes === 1 ? 'node' : 'nodes'} between free end and flywheel.${modes.length > SHAPES ? ` The lowest ${SHAPES} of ${modes.length} modes are drawn.` : ''}`}
      x={x}
      y={y}
      series={series}
    />
  )
}

/** Natural frequencies level, orders rising with speed: a critical is where they cross. */
export function SpeedFrequency({ torsion, operating }: { torsion: Torsion; operating: Train['operating'] }) {
  const { speedRpm } = useResults()
  const { modes, criticals, range } = torsion
  const end = range ? fromSi((1 + NEAR) * range.to, 'rpm') : speedRpm
  const orders = shownOrders(criticals, ORDERS)
  const first = hertz(modes[0].frequency)
  const top = Math.max(1.15 * first, (orders[orders.length - 1] * end) / 60)
  const level = modes.map(({ frequency }) => hertz(frequency)).filter((frequency) => frequency <= top)
  const series: Series[] = [
    ...level.map((frequency, i): Series => ({
      name: `mode ${i + 1}`,
      look: 'v',
      xs: [0, end],
      ys: [frequency, frequency],
    })),
    ...orders.map((order): Series => ({
      name: `order ${orderText(order)}`,
      look: 'past',
      xs: [0, end],
      ys: [0, (order * end) / 60],
    })),
  ]
  const drawn = strongest(criticals).filter(
    ({ order, mode }) => orders.includes(order) && mode < level.length,
  )
  const crossed = spaced(drawn, LEAST_APART * toSi(end, 'rpm')).slice(0, ORDERS)
  return (
    <LineChart
      title="Frequencies over speed"
      sentence={
        crossed.length > 0
          ? `Level: natural frequencies. Rising: orders, at order × speed. ${crossed.length === 1 ? 'A critical much fed is' : 'Criticals much fed are'} marked at ${crossed.map(({ speed }) => rpmText(speed)).join(', ')} rpm.`
          : 'Level: natural frequencies. Rising: orders, at order × speed. No line crosses in or near the running range.'
      }
      x={{
        name: 'Speed',
        unit: 'rpm',
        format: (value) => formatNumber(value, { decimals: 0 }),
        values: [0, end],
      }}
      y={{
        name: 'Frequency',
        unit: 'Hz',
        format: (value) => formatNumber(value, { decimals: 0 }),
        span: { from: 0, to: top },
      }}
      series={series}
      marks={crossed.map(({ speed, mode }) => ({
        x: fromSi(speed, 'rpm'),
        y: hertz(modes[mode].frequency),
        text: rpmText(speed),
      }))}
      rulers={speedRulers(operating)}
    />
  )
}
