'use client'

import { useMemo } from 'react'
import { behindCell } from '@/components/figures/behind-cell'
import { DEGREES } from '@/components/figures/axis'
import { DataTable } from '@/components/ui/data-table'
import { StatusMark } from '@/components/ui/icon'
import type { FigureId } from '@/lib/mechanics/explain/explain'
import { indicatedDoubts } from '@/lib/mechanics/indicated-doubts'
import type { Column, Table } from '@/lib/tables/table'
import { fileUnit } from '@/lib/units/file-unit'
import { scaleFor, type Quantity, type System } from '@/lib/units/quantities'
import { fromSi, toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import type { GasLine } from './gas-lines'

/** Mean effective pressures, power and peaks: the engine's, and each cylinder's where they differ. */
export function IndicatedFigures({ lines }: { lines: GasLine[] }) {
  const { document, train, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const table = useMemo(
    () =>
      tableOf(
        lines,
        document.cylinders.map(({ id }) => id),
        toSi(speedRpm, 'rpm'),
        document.cycle,
        system,
      ),
    [lines, document, speedRpm, system],
  )
  const doubts = lines.flatMap(({ name, engine }) =>
    indicatedDoubts(engine).map((doubt) => ({ ...doubt, name })),
  )
  // only what works in the engine is explained: a line shown beside it is not the engine's
  const inEngine = (name: unknown) => name === (document.gas.model === 'trace' ? 'measured' : 'model')
  const figure = behindCell(table, (row, column) => {
    const [name, of] = table.rows[row]
    const id = shown[column - 2]?.id
    if (document.gas.model === 'none' || !id || !inEngine(name)) return undefined
    const one = train.cylinders.find((each) => of === `cylinder ${each.id}`)
    const own = lines.find((line) => line.name === name)
    const peaks = own?.engine.cylinders.map(({ peakPressure }) => peakPressure) ?? []
    const highest = train.cylinders[peaks.indexOf(Math.max(...peaks))]
    return { figure: id, cylinder: one?.id ?? (id === 'peak-pressure' ? highest?.id : undefined) }
  })
  return (
    <>
      {doubts.map(({ code, message, name }) => (
        <p key={name + code} className="gas-doubt">
          <span className="st mon">
            <StatusMark kind="monitor" />
            {name === 'model' ? 'Model' : 'Measured'}
          </span>{' '}
          {message}
        </p>
      ))}
      <DataTable table={table} figure={figure} />
    </>
  )
}

interface Shown {
  id: FigureId
  name: string
  quantity: Quantity
  decimals: number
  of(line: Sums): number
}

interface Sums {
  netPressure: number
  grossPressure: number
  power: number
  peakPressure: number
  peakAngle: number
}

const shown: Shown[] = [
  {
    id: 'imep',
    name: 'Net mean effective pressure',
    quantity: 'pressure',
    decimals: 2,
    of: (it) => it.netPressure,
  },
  {
    id: 'imep-gross',
    name: 'Gross mean effective pressure',
    quantity: 'pressure',
    decimals: 2,
    of: (it) => it.grossPressure,
  },
  { id: 'indicated-power', name: 'Indicated power', quantity: 'power', decimals: 1, of: (it) => it.power },
  {
    id: 'peak-pressure',
    name: 'Peak pressure',
    quantity: 'pressure',
    decimals: 1,
    of: (it) => it.peakPressure,
  },
]

function tableOf(lines: GasLine[], ids: string[], speed: number, cycle: string, system: System): Table {
  const column = ({ name, quantity, decimals }: Shown): Column => {
    const { unit } = scaleFor(0, quantity, system)
    return { name, unit, si: fileUnit(unit), decimals }
  }
  const turns = cycle === 'four-stroke' ? 4 * Math.PI : 2 * Math.PI
  const row = (name: string, of: string, sums: Sums) => [
    name,
    of,
    ...shown.map((figure) => fromSi(figure.of(sums), scaleFor(0, figure.quantity, system).unit)),
    sums.peakAngle * DEGREES,
  ]
  return {
    title: 'Indicated figures',
    columns: [
      { name: 'Gas', unit: '' },
      { name: 'Of', unit: '' },
      ...shown.map(column),
      { name: 'Peak after firing top dead centre', unit: '°', decimals: 1 },
    ],
    rows: lines.flatMap(({ name, engine }) => {
      const { cylinders } = engine
      const highest = cylinders.reduce((best, one) => (one.peakPressure > best.peakPressure ? one : best))
      const same = cylinders.every((one) => one === cylinders[0])
      return [
        row(name, 'engine', { ...engine, ...highest }),
        ...(same
          ? []
          : cylinders.map((one, i) =>
              row(name, `cylinder ${ids[i]}`, {
                ...one,
                netPressure: one.netWork / one.swept,
                grossPressure: one.grossWork / one.swept,
                power: (one.netWork * speed) / turns,
              }),
            )),
      ]
    }),
  }
}
