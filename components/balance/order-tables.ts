import type { OrderTurning, Turning } from '@/lib/mechanics/balance/turning'
import { scaleFor, type System } from '@/lib/units/quantities'
import { fromSi, units } from '@/lib/units/units'
import type { Cell, Column, Table } from '@/lib/tables/table'

export interface OrderRow {
  name: string
  order: OrderTurning
}

const parts = ['forward', 'backward', 'long axis', 'short axis'] as const
const sizesOf = ({ forward, backward, major, minor }: Turning) => [forward.size, backward.size, major, minor]

type Kind = 'force' | 'couple'
const titles: Record<Kind, string> = { force: 'Shaking force', couple: 'Shaking couple' }

/** Orders of force or couple at a speed, N or N m, in the units of the sheet. */
export function orderTable(kind: Kind, rows: readonly OrderRow[], system: System): Table {
  const { columns, cells } = columnsFor(kind, rows, system)
  return {
    title: titles[kind],
    columns: [{ name: 'Order', unit: '' }, ...columns],
    rows: rows.map(({ name, order }) => [name, ...cells(order[kind])]),
  }
}

/** The same of the layout alone, in units of one cylinder's first term of each order. */
export const layoutTable = (kind: Kind, rows: readonly OrderRow[]): Table => ({
  title: `${titles[kind]} of the layout`,
  columns: [
    { name: 'Order', unit: '' },
    ...parts.map((part): Column => ({ name: part, unit: '', decimals: 3 })),
    tiltColumn,
  ],
  rows: rows.map(({ name, order }) => [name, ...sizesOf(order[kind]), tiltCell(order[kind], 5e-4)]),
})

const tiltColumn: Column = { name: 'tilt', unit: '°', decimals: 0 }

/** A circle and a figure that reads as nothing have no long axis. */
const tiltCell = ({ tilt, major, minor }: Turning, nothing: number): Cell =>
  major <= nothing || major - minor <= nothing ? null : fromSi(tilt, '°')

function columnsFor(kind: Kind, rows: readonly OrderRow[], system: System) {
  const most = Math.max(...rows.map(({ order }) => order[kind].major))
  const { unit } = scaleFor(most, kind === 'force' ? 'force' : 'torque', system)
  const shown = fromSi(most, unit)
  const decimals = shown >= 1000 ? 0 : shown >= 100 ? 1 : 2
  const si = { unit: kind === 'force' ? 'N' : 'N m', factor: units[unit].factor }
  return {
    columns: [...parts.map((part): Column => ({ name: part, unit, si, decimals })), tiltColumn],
    cells: (turning: Turning): Cell[] => [
      ...sizesOf(turning).map((value) => fromSi(value, unit)),
      tiltCell(turning, 0.5 * 10 ** -decimals * units[unit].factor),
    ],
  }
}
