'use client'

import { useMemo, useState } from 'react'
import type { Behind } from '@/components/figures/behind'
import { behindCell } from '@/components/figures/behind-cell'
import { CycleChart } from '@/components/figures/cycle-chart'
import { LeafSection } from '@/components/figures/leaf'
import { Figures } from '@/components/figures/note'
import { SpeedWords } from '@/components/figures/speed-words'
import { DataTable } from '@/components/ui/data-table'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { bankCylinders, momentFigures, torqueSignal } from '@/lib/mechanics/loads/turning-moment'
import type { Table } from '@/lib/tables/table'
import { formatQuantity } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import { DEGREES, degreesText, quantityAxis } from '@/components/figures/axis'
import { Flywheel } from './flywheel'

interface Group {
  name: string
  cylinders: number[]
}

/** The whole engine, each bank, each cylinder. */
function groupsOf(parts: CycleParts): Group[] {
  const { cylinders, banks } = parts.train
  const whole = { name: 'all cylinders', cylinders: cylinders.map((_, index) => index) }
  if (cylinders.length === 1) return [whole]
  return [
    whole,
    ...(banks.length > 1
      ? banks.map(({ id }, index) => ({ name: `bank ${id}`, cylinders: bankCylinders(parts, index) }))
      : []),
    ...cylinders.map(({ id }, index) => ({ name: `cylinder ${id}`, cylinders: [index] })),
  ].filter((group) => group.cylinders.length > 0)
}

/** Turning moment of the engine or a part of it, and the flywheel it asks for. */
export function TurningSection({ parts }: { parts: CycleParts }) {
  const { document, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const speed = toSi(speedRpm, 'rpm')
  const all = useMemo(
    () =>
      groupsOf(parts).map((group) => ({
        ...group,
        figures: momentFigures(torqueSignal(parts, 'total', speed, group.cylinders), parts.train.cycle),
      })),
    [parts, speed],
  )
  const [chosenName, setChosenName] = useState<string | null>(null)
  const found = all.findIndex(({ name }) => name === chosenName)
  const chosen = found < 0 ? 0 : found
  const { name, cylinders, figures } = all[chosen]
  const series = useMemo(
    () =>
      (['total', 'gas', 'inertia'] as const).map((part) => ({
        name: part,
        look: part === 'total' ? ('res' as const) : part,
        values: torqueSignal(parts, part, speed, cylinders),
      })),
    [parts, speed, cylinders],
  )
  const table = useMemo(() => momentTable(all, system), [all, system])
  /** A bank's or a cylinder's own share has no explanation of its own. */
  const whole = (behind: Behind) => (chosen === 0 ? behind : undefined)
  const torque = (value: number) => formatQuantity(value, 'torque', system)
  return (
    <LeafSection title="Turning moment" at={<SpeedWords />} wide>
      {all.length > 1 ? (
        <div className="loads-tools">
          <label className="pick-label">
            moment of{' '}
            <select className="pick" value={name} onChange={(event) => setChosenName(event.target.value)}>
              {all.map((group) => (
                <option key={group.name}>{group.name}</option>
              ))}
            </select>
          </label>
        </div>
      ) : null}
      <CycleChart
        name={`Turning moment of ${name}`}
        quantity="torque"
        series={document.gas.model === 'none' ? series.slice(0, 1) : series}
        wide
      />
      <div className="loads-pair">
        <Figures
          rows={[
            {
              name: 'Mean',
              figure: torque(figures.mean),
              behind: whole('torque-mean'),
            },
            {
              name: `Most, at ${degreesText(figures.most.angle)}`,
              figure: torque(figures.most.value),
              behind: whole({ figure: 'torque', angleDeg: figures.most.angle * DEGREES }),
            },
            {
              name: `Least, at ${degreesText(figures.least.angle)}`,
              figure: torque(figures.least.value),
              behind: whole({ figure: 'torque', angleDeg: figures.least.angle * DEGREES }),
            },
            {
              name: 'Power of the mean',
              figure: formatQuantity(figures.mean * speed, 'power', system),
              behind: whole('mean-power'),
            },
            {
              name: 'Energy, to and fro',
              figure: formatQuantity(figures.energy, 'energy', system),
              behind: whole('energy-fluctuation'),
            },
          ]}
        />
        <Flywheel energy={all[0].figures.energy} speed={speed} />
      </div>
      {all.length > 1 ? (
        <DataTable
          table={table}
          chosen={chosen}
          onChoose={(row) => setChosenName(all[row].name)}
          figure={behindCell(table, (row, column) =>
            row === 0 ? behindWhole(all[0].figures)[column] : undefined,
          )}
          page={20}
        />
      ) : null}
    </LeafSection>
  )
}

const behindWhole = ({ most, least }: ReturnType<typeof momentFigures>): (Behind | undefined)[] => [
  undefined,
  'torque-mean',
  { figure: 'torque', angleDeg: most.angle * DEGREES },
  undefined,
  { figure: 'torque', angleDeg: least.angle * DEGREES },
  undefined,
  'energy-fluctuation',
]

function momentTable(all: (Group & { figures: ReturnType<typeof momentFigures> })[], system: System): Table {
  const peak = Math.max(...all.map(({ figures }) => figures.most.value))
  const torque = quantityAxis('', 'torque', peak, system)
  const energy = quantityAxis('', 'energy', Math.max(...all.map(({ figures }) => figures.energy)), system)
  return {
    title: 'Turning moment by bank and cylinder',
    columns: [
      { name: 'Of', unit: '' },
      torque.column('Mean'),
      torque.column('Most'),
      { name: 'at', unit: '°', decimals: 0 },
      torque.column('Least'),
      { name: 'there at', unit: '°', decimals: 0 },
      energy.column('Energy, to and fro'),
    ],
    rows: all.map(({ name, figures: { mean, most, least, energy: work } }) => [
      name,
      torque.shown(mean),
      torque.shown(most.value),
      most.angle * DEGREES,
      torque.shown(least.value),
      least.angle * DEGREES,
      energy.shown(work),
    ]),
  }
}
