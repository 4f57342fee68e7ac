import { convert, units, type UnitName } from '@/lib/units/units'
import { formatNumber, withUnit } from '@/lib/units/format'
import { cylinderValues } from '@/scene/model/cylinder-values'
import { usualRange } from '@/scene/model/engine-class'
import type { Scene } from '@/scene/model/scene'
import type { Doubt, Mend, Typed } from './field'

/**
 * What is usual, to catch slips of the unit or the key before they reach the drawing. Ranges are common practice and
 * wider than those of any class; a value outside is asked about, never forbidden.
 */
interface Range {
  low: number
  high: number
}

/** In document units. */
type Usual = (scene: Scene) => Range | null

const common = ({ train }: Scene) => cylinderValues(train, train.cylinders[0])

/** Masses grow with the cube of the bore: `low` and `high` are grams per cubic centimetre of it. */
const byBore =
  (low: number, high: number): Usual =>
  (scene) => {
    const cube = (common(scene).boreMm / 10) ** 3 / 1000
    return { low: low * cube, high: high * cube }
  }
const by =
  (of: (scene: Scene) => number, low: number, high: number): Usual =>
  (scene) => ({ low: low * of(scene), high: high * of(scene) })
const within =
  (low: number, high: number): Usual =>
  () => ({ low, high })

export const usual = {
  piston: byBore(0.26, 0.56),
  pistonPin: byBore(0.06, 0.2),
  rod: byBore(0.4, 1.1),
  bearing: byBore(0.02, 0.08),
  oil: within(0.001, 0.008),
  bore: by((scene) => common(scene).strokeMm, 0.22, 2.4),
  stroke: by((scene) => common(scene).boreMm, 0.42, 4.6),
  rodLength: by((scene) => common(scene).strokeMm, 1.35, 2.7),
  rodCentre: by((scene) => common(scene).rodLengthMm, 0.2, 0.45),
  pressure: within(0.3, 5),
} satisfies Record<string, Usual>

/** Beyond the usual by these factors is a slip of unit or key rather than an unusual engine. */
interface Far {
  below: number
  above: number
}

/**
 * Asks about a value that is far out of the usual, offering the same figure in another unit, or with its point or
 * noughts elsewhere, where that lands inside. A marine or model engine lies outside too: keeping the value is always
 * one press away.
 */
export function slip(range: Usual, documentUnit: UnitName, others: UnitName[], far: Far) {
  return (value: number, scene: Scene, typed: Typed): Doubt | null => {
    const usually = range(scene)
    if (!usually || value <= 0) return null
    if (value >= usually.low / far.below && value <= usually.high * far.above) return null
    const shown = (amount: number) => figure(convert(amount, documentUnit, typed.unit))
    const asTyped = withUnit(plain(typed.number), typed.unit)
    return {
      head:
        value < usually.low
          ? `Too ${small(documentUnit)} to be meant.`
          : `Too ${large(documentUnit)} to be meant.`,
      message: `${asTyped} here; usual is ${shown(usually.low)} to ${withUnit(shown(usually.high), typed.unit)}.`,
      mends: meant(typed, documentUnit, others, usually),
      keep: `Keep ${asTyped}`,
    }
  }
}

/** The likeliest of: another unit, a point or nought elsewhere, both. */
function meant(typed: Typed, documentUnit: UnitName, others: UnitName[], usually: Range): Mend[] {
  const elsewhere = others.filter((unit) => units[unit].factor !== units[typed.unit].factor)
  const candidates = [1, 0.1, 10, 0.01, 100].flatMap((shift) =>
    (shift === 1 ? elsewhere : [typed.unit, ...elsewhere]).map((unit) => ({
      number: Number((typed.number * shift).toPrecision(12)),
      unit,
    })),
  )
  const found = candidates.find(({ number, unit }) =>
    inside(convert(number, unit, documentUnit), usually, 1.2),
  )
  if (!found) return []
  const text = withUnit(plain(found.number), found.unit)
  const same = withUnit(figure(convert(found.number, found.unit, typed.unit)), typed.unit)
  return [{ label: found.unit === typed.unit ? `Use ${text}` : `Use ${text} = ${same}`, text }]
}

const inside = (value: number, { low, high }: Range, slack: number) =>
  value >= low / slack && value <= high * slack
const small = (unit: UnitName) => (unit === 'kg' ? 'light' : unit === 'mm' ? 'short' : 'small')
const large = (unit: UnitName) => (unit === 'kg' ? 'heavy' : unit === 'mm' ? 'long' : 'large')
const figure = (value: number) => formatNumber(value, { significant: 3 })
const plain = (value: number) => String(Number(value.toPrecision(8))).replace('-', '\u2212')

/** 0.5 in a field of percents: half a percent, or a half? */
export function percentSlip(value: number, _scene: Scene, typed: Typed): Doubt | null {
  if (typed.unit !== '%' || value <= 0 || value > 0.01) return null
  const asTyped = `${plain(typed.number)} %`
  const meantShare = `${Number((typed.number * 100).toPrecision(6))} %`
  return {
    head: `${asTyped}?`,
    message: 'Factors are percent.',
    mends: [{ label: `Use ${meantShare}`, text: meantShare }],
    keep: `Keep ${asTyped}`,
  }
}

/** 100 % of one piston on a pin that two share is 50 % of both: a high factor may be quoted of one. */
export function factorSlip(value: number, scene: Scene, typed: Typed): Doubt | null {
  const slipped = percentSlip(value, scene, typed)
  if (slipped || typed.unit !== '%') return slipped
  const { train } = scene
  const asTyped = `${plain(typed.number)} %`
  const shared = Math.max(
    ...train.throws.map(({ id }) => train.cylinders.filter((cylinder) => cylinder.throw === id).length),
  )
  if (value <= 0.6 || shared < 2) return null
  const share = `${Number(((100 * value) / shared).toPrecision(6))} %`
  return {
    head: 'Which definition?',
    message: `${asTyped} of one piston on a pin with ${shared} rods is ${share} of all on it, which is what is meant here.`,
    mends: [{ label: `Use ${share}`, text: share }],
    keep: `Keep ${asTyped}`,
  }
}

/** 900° is a half turn, said otherwise. */
export function angleSlip(value: number, _scene: Scene, typed: Typed): Doubt | null {
  if (Math.abs(value) <= 360) return null
  const wrapped = `${plain(Number((((value % 360) + 360) % 360).toPrecision(12)))}°`
  const asTyped = typed.unit === '°' ? `${plain(typed.number)}°` : withUnit(plain(typed.number), typed.unit)
  return {
    head: 'More than a turn.',
    message: `${asTyped} wraps to ${wrapped}.`,
    mends: [{ label: `Use ${wrapped}`, text: wrapped }],
    keep: `Keep ${asTyped}`,
  }
}

/** Speeds at which the piston would move faster than any does. */
export function speedSlip(value: number, scene: Scene, typed: Typed): Doubt | null {
  const piston = (2 * common(scene).strokeMm * value) / 60000
  if (piston <= 45) return null
  const fewer = String(Math.round(typed.number / 10))
  const most = usualRange(scene.train, 'pistonSpeedMost')?.[1] ?? 27
  return {
    head: 'Extra zero?',
    message: `${formatNumber(value, { decimals: 0 })} rpm is a mean piston speed of ${piston.toFixed(0)} m/s; usual for this class is up to ${most}.`,
    mends: [{ label: `Use ${fewer} rpm`, text: `${fewer} rpm` }],
    keep: 'Keep it',
  }
}

/** A share of the rod typed where a distance is asked for. */
export function centreSlip(value: number, scene: Scene, typed: Typed): Doubt | null {
  const { rodLengthMm: rod } = common(scene)
  if (value > 1 || value < 0.05)
    return slip(usual.rodCentre, 'mm', ['in', 'cm'], { below: 1.6, above: 3 })(value, scene, typed)
  const at = `${plain(Number((value * rod).toPrecision(4)))} mm`
  return {
    head: 'A share, or a distance?',
    message: `${withUnit(plain(typed.number), typed.unit)} from the big end here; the centre of gravity lies between the ends, usually at 0.26 to 0.36 of the rod.`,
    mends: [{ label: `Use ${plain(typed.number)} of the rod = ${at}`, text: at }],
    keep: `Keep ${withUnit(plain(typed.number), typed.unit)}`,
  }
}

/** What can never be below nothing. */
export function notNegative(name: string) {
  return (value: number, typed: Typed) => {
    if (value >= 0) return null
    const positive = withUnit(plain(Math.abs(typed.number)), typed.unit)
    return {
      message: `${name} cannot be negative. You typed ${withUnit(plain(typed.number), typed.unit)}.`,
      mends: [{ label: `Use ${positive}`, text: positive }],
    }
  }
}
