import { DEGREES } from '@/components/figures/axis'
import type { Table } from '@/lib/tables/table'
import { fileUnit } from '@/lib/units/file-unit'
import { scaleFor, type System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import type { ClearanceList } from '@/scene/frame/clearance-list'

/** The column of the least gaps. */
export const GAP = 3

/** Every clearance as a row; what is not known stands below with nothing in it. */
export function clearanceTable({ clearances, notKnown }: ClearanceList, system: System): Table {
  const { unit } = scaleFor(0, 'length', system)
  const length = { unit, si: fileUnit(unit), decimals: system === 'si' ? 1 : 3 }
  return {
    title: 'Clearances over one turn of the crank',
    columns: [
      { name: 'Clearance', unit: '' },
      { name: 'Between', unit: '' },
      { name: 'And', unit: '' },
      { name: 'Least gap', ...length },
      { name: 'At', unit: '°', decimals: 1 },
      { name: 'Limit', ...length },
      { name: 'Stands', unit: '' },
    ],
    rows: [
      ...clearances.map(({ name, labels, gap, angle, limit, status }) => [
        name,
        ...labels,
        fromSi(gap, unit),
        angle === null ? null : angle * DEGREES,
        fromSi(limit, unit),
        status,
      ]),
      ...notKnown.map(({ name }) => [name, null, null, null, null, null, 'not known']),
    ],
  }
}
