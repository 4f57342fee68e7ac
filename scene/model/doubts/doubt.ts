import { formatNumber, withUnit } from '@/lib/units/format'
import { scaleFor, type Quantity, type System } from '@/lib/units/quantities'
import { convert, toSi, type UnitName } from '@/lib/units/units'
import type { Change } from '../path'

/** A value that is taken and asked about. Paths are dotted, from the train. */
export interface Doubt {
  code: string
  path: string
  /** What was understood, in the unit of the document or of the ratio. */
  value: number
  /** "Rod to stroke 1.20." */
  head: string
  /** What is usual, and why it matters. */
  message: string
  /** One mend: what it would set. */
  mend?: Mend
}

export interface Mend {
  label: string
  /** Paths are from the train. */
  changes: Change[]
}

/** "masses.rod.massKg" as the keys of a path. */
export const keysOf = (path: string) =>
  path.split('.').map((step) => (/^\d+$/.test(step) ? Number(step) : step))

/** A document's number as the sheet writes it: "318 g", "5.77 in". */
export function written(value: number, unit: UnitName, quantity: Quantity, system: System): string {
  const { unit: shown } = scaleFor(toSi(value, unit), quantity, system)
  return withUnit(short(convert(value, unit, shown)), shown)
}

/** Both ends of a range in one unit: "220 to 480 g". */
export function writtenRange(
  [low, high]: readonly [number, number],
  unit: UnitName,
  quantity: Quantity,
  system: System,
): string {
  const { unit: shown } = scaleFor(toSi(high, unit), quantity, system)
  return withUnit(`${short(convert(low, unit, shown))} to ${short(convert(high, unit, shown))}`, shown)
}

/** Three figures, without the noughts that say nothing. */
export const short = (value: number) =>
  Math.abs(value) >= 1000
    ? formatNumber(value, { decimals: 0 })
    : formatNumber(value, { significant: 3 })
        .replace(/(\.\d*?)0+$/, '$1')
        .replace(/\.$/, '')

/** A value brought to three figures that still lies on this side of a limit. */
export function roundedWithin(value: number, side: 'above' | 'below'): number {
  if (value === 0) return 0
  const step = 10 ** (Math.floor(Math.log10(Math.abs(value))) - 2)
  const count = value / step
  const whole = side === 'above' ? Math.ceil(count - 1e-9) : Math.floor(count + 1e-9)
  return Number((whole * step).toPrecision(6))
}
