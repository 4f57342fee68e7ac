import { formatNumber, withUnit } from './format'
import { quantities, scaleFor, type Quantity, type System } from './quantities'
import { toSi, units, type UnitName } from './units'

/** An offered repair: press it and this text stands in the field. */
export interface Mend {
  label: string
  text: string
}

export type Parsed =
  | { ok: true; value: number; number: number; unit: UnitName }
  | { ok: false; code: string; message: string; mends: Mend[] }

/**
 * Reads what a person typed as a quantity.
 * Takes unit suffixes (`3.74 in`, `3 1/2"`, `88,9 mm`), thousands commas, minus as - or U+2212, fractions.
 * `as` says what a bare number means: a system's usual unit, or one unit.
 * The answer carries the SI value and also number and unit as typed, so that a document in the same unit gets
 * exactly the typed number.
 */
export function parseQuantity(text: string, quantity: Quantity, as: System | UnitName): Parsed {
  const spec = quantities[quantity]
  const bare: UnitName = as === 'si' || as === 'us' ? scaleFor(0, quantity, as).unit : as
  const cleaned = normalise(text)
  const found = splitNumber(cleaned)
  if (!found) return unread(text, cleaned, spec)

  const comma = readCommas(found.digits)
  if (comma === 'unclear') return unread(text, cleaned, spec)
  // "3,500" in a field that never shows 3,500 without a decimal: three and a half, or three and a half thousand?
  const suffix = cleaned.slice(found.length).trim()
  if (comma === 'ambiguous' && showsDecimals(quantity)) return ambiguous(found.digits, suffix)

  const number = found.value(comma === 'ambiguous' ? found.digits.replace(/,/g, '') : comma)
  if (!Number.isFinite(number)) return notANumber(spec)
  const unit = suffix === '' ? bare : spec.accepts.find((name) => isWritten(name, suffix))
  if (unit === undefined) return wrongUnit(number, suffix, quantity)
  return { ok: true, value: toSi(number, unit), number, unit }
}

const FRACTIONS: Record<string, string> = {
  '½': '1/2',
  '¼': '1/4',
  '¾': '3/4',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
}

function normalise(text: string): string {
  return text
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (sign) => ` ${FRACTIONS[sign]}`)
    .replace(/[\u2212\u2013\u2012]/g, '-')
    .replace(/[\u00a0\u2009\u202f]/g, ' ')
    .replace(/[″”“]|''/g, '"')
    .replace(/[′’]/g, "'")
    .replace(/\s+/g, ' ')
    .trim()
}

interface Found {
  digits: string
  length: number
  value: (digits: string) => number
}

function splitNumber(text: string): Found | null {
  const fraction = /^([+-]?)(?:(\d+)[ -])?(\d+)\/(\d+)/.exec(text)
  if (fraction) {
    const [whole, sign, units, top, bottom] = fraction
    const size = Number(units ?? 0) + Number(top) / Number(bottom)
    return { digits: '', length: whole.length, value: () => (sign === '-' ? -size : size) }
  }
  const plain = /^([+-]?)((?:\d{1,3}(?: \d{3})+|[\d,]+)?(?:\.\d*)?)(e[+-]?\d+)?/i.exec(text)
  if (!plain || !/\d/.test(plain[2])) return null
  const [whole, sign, digits, power = ''] = plain
  return {
    digits: digits.replace(/ /g, ''),
    length: whole.length,
    value: (clean) => Number(`${sign}${clean}${power}`),
  }
}

/** The digits with their commas understood, or why they cannot be. */
function readCommas(digits: string): string | 'ambiguous' | 'unclear' {
  if (!digits.includes(',')) return digits
  const thousands = /^\d{1,3}(,\d{3})+(\.\d*)?$/.test(digits)
  if (thousands && (digits.includes('.') || digits.split(',').length > 2)) return digits.replace(/,/g, '')
  if (thousands) return 'ambiguous'
  return /^\d+,\d+$/.test(digits) ? digits.replace(',', '.') : 'unclear'
}

const showsDecimals = (quantity: Quantity) =>
  quantities[quantity].si.some(({ digits }) => 'significant' in digits || digits.decimals > 0)

const isWritten = (name: UnitName, suffix: string) =>
  (units[name].written as readonly string[]).includes(suffix.toLowerCase())

function ambiguous(digits: string, suffix: string): Parsed {
  const point = digits.replace(',', '.')
  const whole = digits.replace(',', '')
  const unit = suffix ? ` ${suffix}` : ''
  const short = formatNumber(Number(point), { significant: 4 }).replace(/\.?0+$/, '')
  return {
    ok: false,
    code: 'U01',
    message: `Did you mean ${short} or ${whole}? The comma can be read both ways.`,
    mends: [
      { label: `Use ${short}${unit}`, text: `${short}${unit}` },
      { label: `Use ${whole}${unit}`, text: `${whole}${unit}` },
    ],
  }
}

function unread(text: string, cleaned: string, spec: { name: string; example: string }): Parsed {
  const word = /^[a-z][a-z ]*$/i.test(cleaned) && !/^(nan|-?infinity)$/i.test(cleaned)
  if (!word && !/\d/.test(cleaned)) return notANumber(spec)
  return {
    ok: false,
    code: 'A02',
    message: `Could not read “${text.trim()}” as ${spec.name}. Example: ${spec.example}.`,
    mends: [],
  }
}

const notANumber = (spec: { example: string }): Parsed => ({
  ok: false,
  code: 'U04',
  message: `Not a number. Nothing was changed. Example: ${spec.example}.`,
  mends: [],
})

function wrongUnit(number: number, suffix: string, quantity: Quantity): Parsed {
  const spec = quantities[quantity]
  const refuse = (code: string, message: string, mends: Mend[] = []): Parsed => ({
    ok: false,
    code,
    message,
    mends,
  })
  if (quantity === 'unbalance' && /^(ozf|lbf)/i.test(suffix))
    return refuse(
      'U02',
      `Unbalance is mass × distance (oz in), not torque (${suffix}).`,
      /^ozf/i.test(suffix) ? [{ label: `Use ${number} oz in`, text: `${number} oz in` }] : [],
    )
  if (quantity === 'torque' && /^(oz|lb) ?in$/i.test(suffix))
    return refuse('U02', `A moment is force × distance (ozf in, lbf ft), not unbalance (${suffix}).`)
  const known = (Object.keys(units) as UnitName[]).find((name) => name !== '' && isWritten(name, suffix))
  const owner = known && Object.values(quantities).find(({ accepts }) => accepts.includes(known))
  return refuse(
    'U05',
    owner
      ? `${known} is the unit of ${owner.name}, and this is ${spec.name}. Example: ${spec.example}.`
      : `Could not read the unit “${suffix}”. ${capital(spec.name)} takes ${
          spec.accepts
            .map((name) => withUnit('', name).trim())
            .filter(Boolean)
            .join(', ') || 'no unit'
        }.`,
  )
}

const capital = (text: string) => text[0].toUpperCase() + text.slice(1)
