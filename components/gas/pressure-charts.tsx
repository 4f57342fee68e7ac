'use client'

import { useCallback, useMemo, useState } from 'react'
import { DEGREES, quantityAxis } from '@/components/figures/axis'
import { most } from '@/components/figures/signal'
import { LineChart } from '@/components/ui/charts/line-chart'
import { Segmented } from '@/components/ui/segmented'
import { wrapCentred } from '@/lib/numerics/wrap'
import { formatNumber, quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import type { GasLine } from './gas-lines'

const lookOf = { model: 'gas', measured: 'v' } as const

/** Pa: on a logarithmic scale nothing lower is told apart. */
const LEAST_SHOWN = 1e3

const closed = (values: Float64Array) => Float64Array.of(...values, values[0])

const topOf = (lines: GasLine[], cylinder: number) =>
  Math.max(...lines.map(({ engine }) => engine.cylinders[cylinder].peakPressure))

const pressureAxis = (lines: GasLine[], cylinder: number, system: System) =>
  quantityAxis('Pressure', 'pressure', topOf(lines, cylinder), system)

interface Props {
  lines: GasLine[]
  /** Index of the cylinder. */
  cylinder: number
}

/** Pressure over the cycle, counted from firing top dead centre. */
export function AngleChart({ lines, cylinder }: Props) {
  const { clock } = useBench()
  const { model, train } = useResults()
  const system = useSessionState((state) => state.system)
  const half = (train.cycle / 2) * DEGREES
  const fires = model.plan.fires[cylinder]
  const { x, y, series } = useMemo(() => {
    const axis = pressureAxis(lines, cylinder, system)
    const y = { ...axis, span: { to: 1.1 * axis.shown(topOf(lines, cylinder)) } }
    return {
      x: {
        name: 'Angle from firing top dead centre',
        unit: '°',
        format: (value: number) => formatNumber(value, { decimals: 0 }),
        values: lines[0].diagram.angle.map((angle) => angle * DEGREES),
        span: { from: -half, to: half, at: [-1, -0.5, 0, 0.5, 1].map((share) => share * half) },
      },
      y,
      series: lines.map(({ name, diagram }) => ({
        name,
        look: lookOf[name],
        ys: y.all(diagram.pressure),
      })),
    }
  }, [lines, cylinder, system, half])
  const { peakPressure, peakAngle } = lines[0].engine.cylinders[cylinder]
  const follow = useCallback(
    (move: (x: number) => void) => {
      const show = () => move(wrapCentred(clock.angle - fires, clock.cycle) * DEGREES)
      show()
      return clock.subscribe(show)
    },
    [clock, fires],
  )
  return (
    <LineChart
      title="Pressure over the cycle"
      sentence={lines.map((line) => peakSentence(line, cylinder, system)).join(' ')}
      x={x}
      y={y}
      series={series}
      cyclic
      height={280}
      marks={[
        {
          x: peakAngle * DEGREES,
          y: y.shown(peakPressure),
          text: quantityText(peakPressure, 'pressure', system, { decimals: 0 }),
        },
      ]}
      follow={follow}
    />
  )
}

function peakSentence({ name, engine }: GasLine, cylinder: number, system: System): string {
  const { peakPressure, peakAngle } = engine.cylinders[cylinder]
  const side = peakAngle < 0 ? 'before' : 'after'
  return `The ${name === 'model' ? 'model' : 'measured trace'} peaks at ${quantityText(peakPressure, 'pressure', system, { decimals: 1 })}, ${quantityText(Math.abs(peakAngle), 'angle', system)} ${side} firing top dead centre.`
}

type Scale = 'plain' | 'log'

/** Pressure against volume: a loop whose area is the work. */
export function VolumeChart({ lines, cylinder }: Props) {
  const system = useSessionState((state) => state.system)
  const [scale, setScale] = useState<Scale>('plain')
  const log = scale === 'log'
  const { x, y, loops } = useMemo(() => {
    const { volume, angle } = lines[0].diagram
    const y = { ...pressureAxis(lines, cylinder, system), log }
    const x = quantityAxis('Volume', 'volume', most(volume, angle).value, system)
    const loops = lines.map(({ name, diagram }) => ({
      name,
      look: lookOf[name],
      // a logarithm has no place for nothing
      ys: y.all(closed(diagram.pressure).map((p) => (log ? Math.max(p, LEAST_SHOWN) : p))),
      xs: x.all(closed(diagram.volume)),
    }))
    return { x: { ...x, values: loops[0].xs, log, span: log ? undefined : { from: 0 } }, y, loops }
  }, [lines, cylinder, system, log])
  const work = lines
    .map(
      ({ name, engine }) =>
        `${name === 'model' ? 'the model' : 'the measured trace'} ${quantityText(engine.cylinders[cylinder].netWork, 'energy', system)}`,
    )
    .join(', ')
  return (
    <div className="gas-loop">
      <Segmented
        label="Scales of pressure against volume"
        value={scale}
        options={[
          { value: 'plain', label: 'Even scales' },
          { value: 'log', label: 'Logarithmic' },
        ]}
        onChange={setScale}
      />
      <LineChart
        title="Pressure against volume"
        sentence={`The loop’s area is the work of a cycle: ${work}.${log ? ' On logarithmic scales compression and expansion are nearly straight.' : ''}`}
        x={x}
        y={y}
        series={loops}
        height={280}
      />
    </div>
  )
}
