'use client'

import { useMemo } from 'react'
import { DEGREES } from '@/components/figures/axis'
import { DataTable } from '@/components/ui/data-table'
import { StatusMark } from '@/components/ui/icon'
import { indicatedDoubts } from '@/lib/mechanics/indicated-doubts'
import type { Column, Table } from '@/lib/tables/table'
import { fileUnit } from '@/lib/units/file-unit'
import { scaleFor, type Quantity, type System } from '@/lib/units/quantities'
import { fromSi, toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import type { GasLine } from './gas-lines'

/** Mean effective pressures, power and peaks: the engine's, and each cylinder's where they differ. */
export function IndicatedFigures({ lines }: { lines: GasLine[] }) {
  const { document, speedRpm } = useResults()
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
      <DataTable table={table} />
    </>
  )
}

interface Shown {
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
  { name: 'Net mean effective pressure', quantity: 'pressure', decimals: 2, of: (it) => it.netPressure },
  { name: 'Gross mean effective pressure', quantity: 'pressure', decimals: 2, of: (it) => it.grossPressure },
  { name: 'Indicated power', quantity: 'power', decimals: 1, of: (it) => it.power },
  { name: 'Peak pressure', quantity: 'pressure', decimals: 1, of: (it) => it.peakPressure },
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
