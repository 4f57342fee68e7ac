import type { System } from '@/lib/units/quantities'
import { engineClasses, type EngineClass, type Range } from '../class-ranges'
import type { CrankTrain } from '../crank-train'
import { cylinderValues } from '../cylinder-values'
import { engineClassOf, usualRange } from '../engine-class'
import { keysOf, roundedWithin, written, writtenRange, type Doubt } from './doubt'
import { measures, type Measure, type Values } from './measures'

/** Values outside what is usual for the class of the engine. */
export function classDoubts(document: CrankTrain, system: System): Doubt[] {
  const kind = engineClassOf(document)
  if (!kind) return []
  const found = new Map<string, Doubt>()
  document.cylinders.forEach((entry, index) => {
    if (entry.link) return
    const values = cylinderValues(document, entry)
    for (const measure of measures) {
      const range = usualRange(document, measure.range)
      const value = measure.of(document, values)
      if (!range || value === undefined || within(value, range)) continue
      const path = measure.path(document, index)
      const key = `${measure.code} ${path}`
      if (!found.has(key))
        found.set(key, doubtAbout({ measure, range, value, path, kind }, document, values, system))
    }
  })
  return [...found.values()]
}

interface Found {
  measure: Measure
  range: Range
  value: number
  path: string
  kind: EngineClass
}

function doubtAbout(
  { measure, range, value, path, kind }: Found,
  document: CrankTrain,
  values: Values,
  system: System,
): Doubt {
  const { code, name, hint, quantity, unit, mended, mendUnit = unit, mendQuantity = quantity } = measure
  const low = value < range[0]
  const bound = mended?.(low ? range[0] : range[1], document, values)
  const target = bound === undefined ? 0 : roundedWithin(bound, low ? 'above' : 'below')
  const said = [
    `${low ? 'Below' : 'Above'} the usual ${writtenRange(range, unit, quantity, system)} of a ${engineClasses[kind]}.`,
    ...(hint && !low ? [hint] : []),
    ...(code === 'G03' ? [leanWords(values)] : []),
  ]
  return {
    code,
    path,
    value,
    head: `${name}${whose(path, document)} ${written(value, unit, quantity, system)}.`,
    message: said.join(' '),
    ...(target !== 0 && {
      mend: {
        label: `Use ${written(target, mendUnit, mendQuantity, system)}`,
        changes: [{ path: keysOf(path), value: target }],
      },
    }),
  }
}

const within = (value: number, [low, high]: Range) => value >= low * (1 - 1e-6) && value <= high * (1 + 1e-6)

/** Of the one cylinder that states the value for itself. */
function whose(path: string, { cylinders }: CrankTrain): string {
  const [list, index] = path.split('.')
  return list === 'cylinders' ? ` of cylinder ${cylinders[Number(index)].id}` : ''
}

function leanWords({ strokeMm, rodLengthMm, offsetMm }: Values): string {
  const lean = (Math.asin(Math.min(1, (strokeMm / 2 + Math.abs(offsetMm)) / rodLengthMm)) * 180) / Math.PI
  return `The rod leans up to ${lean.toFixed(1)}°. Check the units.`
}
