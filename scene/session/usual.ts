import { convert, units, type UnitName } from '@/lib/units/units'
import { formatNumber, withUnit } from '@/lib/units/format'
import type { Scene } from '@/scene/model/scene'
import type { Doubt } from './field'
import type { System } from '@/lib/units/quantities'

/**
 * What is usual, to catch slips of the unit or the key before they reach the drawing. Ranges are common practice;
 * a value outside is asked about, never forbidden.
 */
export interface Typed {
  number: number
  unit: UnitName
  system: System
}

interface Range {
  low: number
  high: number
}

/** In document units. */
type Usual = (scene: Scene) => Range | null

const boreOf = (scene: Scene) =>
  scene.train.cylinderDefaults.boreMm ?? scene.train.cylinders[0]?.boreMm ?? null
const strokeOf = (scene: Scene) =>
  scene.train.cylinderDefaults.strokeMm ?? scene.train.cylinders[0]?.strokeMm ?? null

/** Masses grow with the cube of the bore: `low` and `high` are grams per cubic centimetre of it. */
const byBore =
  (low: number, high: number): Usual =>
  (scene) => {
    const bore = boreOf(scene)
    if (!bore) return null
    const cube = (bore / 10) ** 3 / 1000
    return { low: low * cube, high: high * cube }
  }
const within =
  (low: number, high: number): Usual =>
  () => ({ low, high })

export const usual = {
  piston: byBore(0.26, 0.56),
  pistonPin: byBore(0.06, 0.2),
  rod: byBore(0.4, 1.1),
  bearing: byBore(0.02, 0.08),
  oil: within(0.001, 0.008),
  bore: ((scene) => {
    const stroke = strokeOf(scene)
    return stroke ? { low: 0.22 * stroke, high: 2.4 * stroke } : null
  }) satisfies Usual,
  stroke: ((scene) => {
    const bore = boreOf(scene)
    return bore ? { low: 0.42 * bore, high: 4.6 * bore } : null
  }) satisfies Usual,
  rodLength: ((scene) => {
    const stroke = strokeOf(scene)
    return stroke ? { low: 1.35 * stroke, high: 2.7 * stroke } : null
  }) satisfies Usual,
  balanceFactor: within(0, 1),
} satisfies Record<string, Usual>

/** Beyond the usual by these factors is a slip of unit or key rather than an unusual engine. */
interface Far {
  below: number
  above: number
}

/**
 * Asks about a value that is far out of the usual, offering the same figure in another unit where that lands inside.
 * A marine or model engine lies outside too: keeping the value is always one press away.
 */
export function slip(range: Usual, documentUnit: UnitName, others: UnitName[], far: Far) {
  return (value: number, scene: Scene, typed: Typed): Doubt | null => {
    const usually = range(scene)
    if (!usually || value <= 0) return null
    if (value >= usually.low / far.below && value <= usually.high * far.above) return null
    const shown = (amount: number) => figure(convert(amount, documentUnit, typed.unit))
    const asTyped = withUnit(plain(typed.number), typed.unit)
    const mends = others
      .filter((unit) => units[unit].factor !== units[typed.unit].factor)
      .filter((unit) => inside(convert(typed.number, unit, documentUnit), usually, 1.5))
      .slice(0, 1)
      .map((unit) => {
        const text = withUnit(plain(typed.number), unit)
        const same = withUnit(figure(convert(typed.number, unit, typed.unit)), typed.unit)
        return { label: `Use ${text} = ${same}`, text }
      })
    return {
      head:
        value < usually.low
          ? `Too ${small(documentUnit)} to be meant.`
          : `Too ${large(documentUnit)} to be meant.`,
      message: `${asTyped} here; usual is ${shown(usually.low)} to ${withUnit(shown(usually.high), typed.unit)}.`,
      mends,
      keep: `Keep ${asTyped}`,
    }
  }
}

const inside = (value: number, { low, high }: Range, slack: number) =>
  value >= low / slack && value <= high * slack
const small = (unit: UnitName) => (unit === 'kg' ? 'light' : unit === 'mm' ? 'short' : 'small')
const large = (unit: UnitName) => (unit === 'kg' ? 'heavy' : unit === 'mm' ? 'long' : 'large')
const figure = (value: number) => formatNumber(value, { significant: 3 })
const plain = (value: number) => String(Number(value.toPrecision(8))).replace('-', '\u2212')

/** 0.5 in a field of percents: half a percent, or a half? */
export function percentSlip(value: number, _scene: Scene, typed: Typed): Doubt | null {
  if (value <= 0 || value > 0.01 || typed.unit !== '%') return null
  const meant = `${Number((typed.number * 100).toPrecision(6))}`
  return {
    head: `${plain(typed.number)} %?`,
    message: 'Factors are percent.',
    mends: [{ label: `Use ${meant} %`, text: `${meant} %` }],
    keep: `Keep ${plain(typed.number)} %`,
  }
}

/** Words about values that are taken and lie outside the usual, by field. */
export function softWords(scene: Scene): Record<string, string> {
  const words: Record<string, string> = {}
  const { cylinderDefaults: defaults, operating, shape } = scene.train
  const { strokeMm: stroke, rodLengthMm: rod, offsetMm: offset = 0, boreMm: bore } = defaults
  if (stroke && rod) {
    const ratio = rod / stroke
    const angle = (Math.asin(Math.min(1, (stroke / 2 + Math.abs(offset)) / rod)) * 180) / Math.PI
    if (ratio < 1.35)
      words.rodLengthMm = `Rod to stroke ${ratio.toFixed(2)} is below the usual 1.5 to 1.9 for car engines. The rod leans up to ${angle.toFixed(1)}°. Check the units.`
    if (ratio > 2.7)
      words.rodLengthMm = `Rod to stroke ${ratio.toFixed(2)} is above the usual 1.5 to 1.9 for car engines. Check the units.`
    if (Math.abs(offset) > 0.15 * stroke) words.offsetMm = 'More than 0.15 of the stroke: unusually far off.'
  }
  if (bore && stroke && (bore / stroke < 0.2 || bore / stroke > 3))
    words.boreMm = `Bore to stroke ${(bore / stroke).toFixed(2)}: one of them looks like inches.`
  if (operating?.idleRpm && operating.ratedRpm && operating.idleRpm >= operating.ratedRpm)
    words.idleRpm = `Idle ${formatNumber(operating.idleRpm, { decimals: 0 })} should be below rated ${formatNumber(operating.ratedRpm, { decimals: 0 })} rpm.`
  if (operating?.ratedRpm && operating.maxRpm && operating.ratedRpm > operating.maxRpm)
    words.maxRpm = 'The most should not be below rated.'
  if (stroke && operating?.maxRpm) {
    const speed = (2 * (stroke / 1000) * operating.maxRpm) / 60
    if (speed > 28)
      words.maxRpm = `Mean piston speed ${speed.toFixed(1)} m/s at the most: above 27 even for racing engines. Extra zero?`
  }
  if (stroke && shape?.pinDiaMm && shape.mainDiaMm && !shape.builtUp) {
    const overlap = (shape.pinDiaMm + shape.mainDiaMm) / 2 - stroke / 2
    if (overlap < 0)
      words.pinDiaMm = `No journal overlap (${formatNumber(overlap, { decimals: 1 })} mm): fine for a built-up crank, weak for one piece.`
  }
  return words
}
