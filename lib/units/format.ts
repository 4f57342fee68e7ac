import { scaleFor, type Digits, type Quantity, type Scale, type System } from './quantities'
import { fromSi } from './units'

const MINUS = '\u2212'

/** A figure as it is written on the sheet: thousands with a comma, minus U+2212, no negative nothing. */
export function formatNumber(value: number, digits: Digits): string {
  if (!Number.isFinite(value)) return '–'
  const decimals =
    'decimals' in digits ? digits.decimals : Math.max(0, digits.significant - 1 - exponent(value))
  const rounded =
    'significant' in digits && value !== 0 ? Number(value.toPrecision(digits.significant)) : value
  const text = Math.abs(rounded).toFixed(Math.min(decimals, 12))
  const [whole, part] = text.split('.')
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ',') + (part ? `.${part}` : '')
  return value < 0 && /[1-9]/.test(text) ? MINUS + grouped : grouped
}

const exponent = (value: number) => (value === 0 ? 0 : Number(value.toExponential(12).split('e')[1]))

export interface Figure {
  text: string
  unit: string
}

/** An SI value as a figure with its unit apart. `digits` overrides the usual precision, `scale` the unit. */
export function formatQuantity(
  si: number,
  quantity: Quantity,
  system: System,
  digits?: Digits,
  scale: Scale = scaleFor(si, quantity, system),
): Figure {
  return { text: formatNumber(fromSi(si, scale.unit), digits ?? scale.digits), unit: scale.unit }
}

/** The same in one piece, for sentences: degrees close up, other units after a space. */
export function quantityText(si: number, quantity: Quantity, system: System, digits?: Digits): string {
  const { text, unit } = formatQuantity(si, quantity, system, digits)
  return withUnit(text, unit)
}

export const withUnit = (text: string, unit: string) =>
  unit === '' ? text : unit === '°' ? `${text}°` : `${text} ${unit}`

/** A length of a document's own number in full, for a field that is being edited: no rounding beyond what was typed. */
export function plainNumber(value: number, atLeast = 0): string {
  const rounded = Number(value.toPrecision(10))
  const [, part = ''] = Math.abs(rounded).toString().split('.')
  if (/e/.test(rounded.toString())) return formatNumber(rounded, { significant: 6 })
  return formatNumber(rounded, { decimals: Math.max(atLeast, part.length) })
}
