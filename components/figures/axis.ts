import type { Axis } from '@/components/ui/charts/types'
import type { Column } from '@/lib/tables/table'
import { fileUnit } from '@/lib/units/file-unit'
import { formatNumber } from '@/lib/units/format'
import { scaleFor, type Quantity, type System } from '@/lib/units/quantities'
import { units } from '@/lib/units/units'

/** An axis for SI values up to `top`, in the unit of the sheet; `shown` turns a value into it. */
export interface QuantityAxis extends Axis {
  shown(si: number): number
  all(si: ArrayLike<number>): Float64Array
  column(name: string): Column
}

export function quantityAxis(name: string, quantity: Quantity, top: number, system: System): QuantityAxis {
  const { unit } = scaleFor(top, quantity, system)
  const { factor } = units[unit]
  const span = Math.abs(top) / factor
  const decimals = span >= 100 ? 0 : span >= 10 ? 1 : 2
  const shown = (si: number) => si / factor
  return {
    name,
    unit,
    si: fileUnit(unit),
    format: (value) => formatNumber(value, { decimals }),
    shown,
    all: (si) => Float64Array.from(si, shown),
    column: (columnName) => ({ name: columnName, unit, si: fileUnit(unit), decimals }),
  }
}

export const DEGREES = 180 / Math.PI
export const degreesText = (angle: number) => `${formatNumber(angle * DEGREES, { decimals: 0 })}°`

export const crankAngleAxis: Axis = {
  name: 'Crank angle',
  unit: '°',
  format: (value) => formatNumber(value, { decimals: 0 }),
}
