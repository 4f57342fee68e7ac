'use client'

import { useMemo, useState } from 'react'
import { Figures } from '@/components/figures/note'
import { LeafSection } from '@/components/figures/leaf'
import { LineChart } from '@/components/ui/charts/line-chart'
import type { Look } from '@/components/ui/charts/types'
import { DataTable } from '@/components/ui/data-table'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { buildSweep, sweepPoint, type SweepPoint } from '@/lib/mechanics/loads/speed-sweep'
import { sweepBounds, sweepSpeeds, type SweepBounds } from '@/lib/mechanics/loads/sweep-bounds'
import type { Table } from '@/lib/tables/table'
import { formatNumber } from '@/lib/units/format'
import type { Quantity, System } from '@/lib/units/quantities'
import { fromSi, standardGravity, toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import { quantityAxis, type QuantityAxis } from '@/components/figures/axis'
import { behindSweep } from './behind-sweep'

interface Line {
  key: Exclude<keyof SweepPoint, 'speed'>
  name: string
  look: Look
}

interface Choice {
  name: string
  quantity: Quantity | 'g'
  lines: Line[]
}

const one = (key: Line['key'], name: string): Line[] => [{ key, name, look: 'v' }]
const two = (first: Line['key'], firstName: string, second: Line['key'], secondName: string): Line[] => [
  { key: first, name: firstName, look: 'v' },
  { key: second, name: secondName, look: 'past' },
]

const choices: Choice[] = [
  { name: 'Shaking force', quantity: 'force', lines: two('force1', 'order 1', 'force2', 'order 2') },
  { name: 'Shaking couple', quantity: 'torque', lines: two('couple1', 'order 1', 'couple2', 'order 2') },
  { name: 'Piston acceleration', quantity: 'g', lines: one('acceleration', 'most') },
  {
    name: 'Load along the rods',
    quantity: 'force',
    lines: two('rodTension', 'pull', 'rodCompression', 'push'),
  },
  { name: 'Load of pins and mains', quantity: 'force', lines: two('pin', 'pin', 'main', 'main') },
  { name: 'Mean piston speed', quantity: 'velocity', lines: one('meanPistonSpeed', 'mean') },
  { name: 'Mean turning moment', quantity: 'torque', lines: one('meanTorque', 'mean') },
  { name: 'Power', quantity: 'power', lines: one('power', 'power') },
]

const SPEEDS = 50

const rpm = (speed: number) => formatNumber(fromSi(speed, 'rpm'), { decimals: 0 })

/** What cancels leaves rounding behind: below this share of the pins' load it is nothing. */
const NOTHING = 1e-6

function withoutRounding(point: SweepPoint): SweepPoint {
  const clean = (value: number) => (value < NOTHING * point.pin ? 0 : value)
  const { force1, force2, couple1, couple2 } = point
  return {
    ...point,
    force1: clean(force1),
    force2: clean(force2),
    couple1: clean(couple1),
    couple2: clean(couple2),
  }
}

/** What grows with speed, from idle to over-speed. */
export function SweepSection({ parts }: { parts: CycleParts }) {
  const { speedRpm, document } = useResults()
  const system = useSessionState((state) => state.system)
  const [chosenName, setChosenName] = useState(choices[0].name)
  const { sweep, bounds, points } = useMemo(() => {
    const built = buildSweep(parts)
    const ends = sweepBounds(parts.train, built.longestTravel)
    return {
      sweep: built,
      bounds: ends,
      points: sweepSpeeds(ends.from, ends.to, SPEEDS).map((speed) =>
        withoutRounding(sweepPoint(built, speed)),
      ),
    }
  }, [parts])
  const { name, quantity, lines } = choices.find((choice) => choice.name === chosenName)!
  const table = useMemo(() => sweepTable(points, system), [points, system])
  const axis = axisOf(name, quantity, points, lines, system)
  const now = withoutRounding(sweepPoint(sweep, toSi(speedRpm, 'rpm')))
  const red = bounds.redline === undefined ? null : withoutRounding(sweepPoint(sweep, bounds.redline))
  const behind = useMemo(() => behindSweep(parts, toSi(speedRpm, 'rpm')), [parts, speedRpm])
  const nothing = lines.every(({ key }) => points.every((point) => point[key] === 0))
  const read = (point: SweepPoint) =>
    lines
      .map(
        (line) =>
          `${lines.length > 1 ? `${line.name} ` : ''}${axis.format(axis.shown(point[line.key]))} ${axis.unit}`,
      )
      .join(', ')
  const within = now.speed >= bounds.from && now.speed <= bounds.to
  return (
    <LeafSection title="Speed sweep" at={`${rpm(bounds.from)} to ${rpm(bounds.to)} rpm`} wide>
      <div className="loads-tools">
        <label className="pick-label">
          of{' '}
          <select className="pick" value={name} onChange={(event) => setChosenName(event.target.value)}>
            {choices.map((choice) => (
              <option key={choice.name}>{choice.name}</option>
            ))}
          </select>
        </label>
      </div>
      <LineChart
        title={`${name} over speed`}
        sentence={
          nothing
            ? nothingWords(name)
            : `At ${rpm(now.speed)} rpm: ${read(now)}.${red ? ` At the red line, ${rpm(red.speed)} rpm: ${read(red)}.` : ''}`
        }
        x={{
          name: 'Speed',
          unit: 'rpm',
          format: (value) => formatNumber(value, { decimals: 0 }),
          values: points.map(({ speed }) => fromSi(speed, 'rpm')),
        }}
        y={axis}
        series={lines.map((line) => ({
          name: line.name,
          look: line.look,
          ys: axis.all(points.map((point) => point[line.key])),
        }))}
        rulers={[
          ...(red ? [{ x: fromSi(red.speed, 'rpm'), text: 'red line' }] : []),
          ...(within ? [{ x: speedRpm, text: 'now' }] : []),
        ]}
      />
      <Figures
        rows={lines.map((line) => ({
          name: `${lines.length > 1 ? `${name}, ${line.name}` : name}, at ${rpm(now.speed)} rpm`,
          figure: { text: axis.format(axis.shown(now[line.key])), unit: axis.unit },
          behind: behind[line.key],
        }))}
      />
      <p className="cap">
        {boundWords(bounds)}{' '}
        {document.gas.model === 'none'
          ? 'No gas model is given: all of it is inertia.'
          : 'The gas pressures of the sheet stand at every speed; only inertia grows, with the square of it.'}{' '}
        Shaking force and couple are the greatest in any direction at that order.
      </p>
      <DataTable table={table} page={10} />
    </LeafSection>
  )
}

const nothingWords = (name: string) =>
  name.startsWith('Shaking')
    ? `${name}: nothing of orders 1 and 2 is left at any speed.`
    : `${name}: nothing at any speed.`

function boundWords({ from, to, fromIs, toIs }: SweepBounds): string {
  const end = {
    max: 'of the maximum speed',
    rated: 'of the rated speed, for no maximum is entered',
    'piston-speed': 'of the speed of 20 m/s mean piston speed, for no maximum is entered',
  }[toIs]
  const start = fromIs === 'idle' ? `idle, ${rpm(from)} rpm,` : `${rpm(from)} rpm, a tenth of the end,`
  return `From ${start} to ${rpm(to)} rpm, 115 % ${end}.`
}

function axisOf(
  name: string,
  quantity: Choice['quantity'],
  points: SweepPoint[],
  lines: Line[],
  system: System,
): QuantityAxis {
  const top = Math.max(...points.flatMap((point) => lines.map(({ key }) => Math.abs(point[key]))))
  if (quantity !== 'g') return quantityAxis(name, quantity, top, system)
  const shown = (si: number) => si / standardGravity
  const si = { unit: 'm/s²', factor: standardGravity }
  return {
    name,
    unit: 'g',
    si,
    format: (value) => formatNumber(value, { decimals: 0 }),
    shown,
    all: (values) => Float64Array.from(values, shown),
    column: (columnName) => ({ name: columnName, unit: 'g', si, decimals: 0 }),
  }
}

function sweepTable(points: SweepPoint[], system: System): Table {
  const columns = choices.flatMap(({ name, quantity, lines }) =>
    lines.map(({ key, name: line }) => ({
      key,
      axis: axisOf(name, quantity, points, lines, system),
      head: lines.length > 1 ? `${name}, ${line}` : name,
    })),
  )
  return {
    title: 'Speed sweep',
    columns: [
      { name: 'Speed', unit: 'rpm', decimals: 0 },
      ...columns.map(({ axis, head }) => axis.column(head)),
    ],
    rows: points.map((point) => [
      fromSi(point.speed, 'rpm'),
      ...columns.map(({ axis, key }) => axis.shown(point[key])),
    ]),
  }
}
