import { formatNumber } from '@/lib/units/format'
import { scaleFor, type Quantity } from '@/lib/units/quantities'
import { convert, fromSi, toSi, type UnitName } from '@/lib/units/units'
import { method } from '../method'
import { evaluate, substitute } from './formula'

/** A symbol of a formula: the word that stands for it, what it is, and its value here. */
export interface SymbolValue {
  symbol: string
  name: string
  value: number
  unit: string
}

/** What a figure is made of, before it is worked out. The formula gives it in `unit`. */
export interface Draft {
  title: string
  quantity: Quantity
  unit: UnitName
  formula: string
  symbols: SymbolValue[]
  assumptions: string[]
  source: string
  /** The same by another definition, or by the textbook's first term. */
  beside?: { name: string; value: number; unit: UnitName }
}

/** What stands behind a figure. `value` is unrounded and in `unit`; `substituted` ends with it as it is shown. */
export interface Explanation extends Draft {
  figure: string
  value: number
  substituted: string
  method: { name: string; version: string }
}

export const symbol = (word: string, name: string, value: number, unit = ''): SymbolValue => ({
  symbol: word,
  name,
  value,
  unit,
})

/** Half of the last place in which the sheet shows a value of this size, in `unit`. */
function shownWithin(value: number, unit: UnitName, quantity: Quantity): number {
  const { digits, unit: shownIn } = scaleFor(toSi(value, unit), quantity, 'si')
  if ('decimals' in digits) return Math.abs(convert(0.5 * 10 ** -digits.decimals, shownIn, unit))
  const shown = Math.abs(convert(value, unit, shownIn))
  if (shown === 0) return 0.5e-3
  return convert(0.5 * 10 ** (Math.floor(Math.log10(shown)) + 1 - digits.significant), shownIn, unit)
}

const plain = (value: number, digits: number) => {
  const text = String(Number(value.toPrecision(digits)))
  return value < 0 ? `(${text.replace('-', '−')})` : text
}

/**
 * Works a draft out. The values are put in with as few figures as still give the result to a tenth of what is shown, so
 * that whoever works it out by hand meets the figure on the sheet.
 */
export function finish(figure: string, draft: Draft): Explanation {
  const values = Object.fromEntries(draft.symbols.map(({ symbol: word, value }) => [word, value]))
  const value = evaluate(draft.formula, values)
  const within = shownWithin(value, draft.unit, draft.quantity) / 10
  let put = ''
  for (let digits = 4; digits <= 17; digits++) {
    const texts = Object.fromEntries(draft.symbols.map((each) => [each.symbol, plain(each.value, digits)]))
    put = substitute(draft.formula, texts)
    if (Math.abs(evaluate(put, {}) - value) <= within) break
  }
  const { unit, digits } = scaleFor(toSi(value, draft.unit), draft.quantity, 'si')
  const own = formatNumber(value, { significant: 7 })
  const shown = formatNumber(fromSi(toSi(value, draft.unit), unit), digits)
  const same = unit === draft.unit
  const result = same ? `${shown} ${unit}` : `${own} ${draft.unit} = ${shown} ${unit}`
  return {
    ...draft,
    figure,
    value,
    substituted: `${put} = ${result.trim()}`,
    method: { ...method },
  }
}
