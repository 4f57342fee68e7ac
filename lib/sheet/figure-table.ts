import { formatQuantity, withUnit } from '@/lib/units/format'
import { scaleFor, type Digits, type Quantity, type Scale, type System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import type { SheetUnits } from './sheet-parts'

/** A table as it is printed: words and figures already written out. The first column holds names. */
export interface SheetTable {
  title: string
  head: string[]
  rows: string[][]
  /** Under which condition, or what the figures assume. */
  words?: string
}

/** Name, SI value and what it is. */
export type Pair = [name: string, value: number, quantity: Quantity]

export const systemsOf = (units: SheetUnits): System[] => (units === 'both' ? ['si', 'us'] : [units])

const systemName = { si: 'SI', us: 'US' } as const

/** Names with their figures, a column for each system of units. */
export function pairTable(
  title: string,
  pairs: readonly Pair[],
  units: SheetUnits,
  words?: string,
): SheetTable {
  const systems = systemsOf(units)
  const cell = (value: number, quantity: Quantity, system: System) => {
    const { text, unit } = formatQuantity(value, quantity, system)
    return withUnit(text, unit)
  }
  return {
    title,
    head: ['', ...systems.map((system) => systemName[system])],
    rows: pairs.map(([name, value, quantity]) => [
      name,
      ...systems.map((system) => cell(value, quantity, system)),
    ]),
    words,
  }
}

export interface FigureColumn {
  name: string
  quantity: Quantity
  values: (number | null)[]
  /** Columns of one quantity share unit and decimals, unless one stands apart. */
  apart?: boolean
}

/** Rows of figures under names, once for each system of units: a quantity has one unit, that of its largest figure. */
export function figureTables(
  title: string,
  first: { name: string; values: string[] },
  columns: readonly FigureColumn[],
  units: SheetUnits,
  words?: string,
): SheetTable[] {
  const mostOf = ({ quantity, apart }: FigureColumn) => {
    const alike = columns.filter((column) => column.quantity === quantity && column.apart === apart)
    return Math.max(0, ...alike.flatMap(({ values }) => values.map((value) => Math.abs(value ?? 0))))
  }
  return systemsOf(units).map((system, index) => {
    const written = columns.map((column) => {
      const { name, quantity, values } = column
      const most = mostOf(column)
      const scale = scaleFor(most, quantity, system)
      const head = scale.unit === '' ? name : `${name}, ${scale.unit}`
      // next to nothing beside the largest is nothing: no zeros with a last digit of noise
      const clean = (value: number) => (Math.abs(value) < 1e-9 * most ? 0 : value)
      const text = (value: number | null) =>
        value === null
          ? '–'
          : formatQuantity(clean(value), quantity, system, digitsFor(most, scale), scale).text
      return { head, texts: values.map(text) }
    })
    return {
      title: units === 'both' ? `${title}, ${systemName[system]}` : title,
      head: [first.name, ...written.map(({ head }) => head)],
      rows: first.values.map((name, row) => [name, ...written.map(({ texts }) => texts[row])]),
      words: index === 0 ? words : undefined,
    }
  })
}

/** Figures under one another end at one place: as many decimals as give the largest three figures. */
function digitsFor(most: number, { unit, digits }: Scale): Digits {
  if (!('significant' in digits)) return digits
  const shown = Math.abs(fromSi(most, unit))
  return {
    decimals:
      shown > 0 ? Math.min(6, Math.max(0, digits.significant - 1 - Math.floor(Math.log10(shown)))) : 0,
  }
}
