import { classRanges, type EngineClass, type Range, type RangeName } from './class-ranges'
import type { CrankTrain } from './crank-train'
import { cylinderValues } from './cylinder-values'

/** The class that somebody has set, or the one that the document looks like; null where no column fits. */
export const engineClassOf = (document: CrankTrain): EngineClass | null =>
  document.engineClass === 'none' ? null : (document.engineClass ?? guessedClass(document))

/** The class that a document looks like, from its cycle, layout, sizes and speeds. */
export function guessedClass(document: CrankTrain): EngineClass | null {
  const { cylinders, banks, throws, cycle, operating = {} } = document
  const values = cylinderValues(document, cylinders[0])
  const { boreMm: bore, strokeMm: stroke, compressionRatio } = values
  const twoStroke = cycle === 'two-stroke'
  if (twoStroke && (bore >= 250 || stroke / bore >= 2)) return 'marine'
  if (cylinders.some(({ link }) => link) || (throws.length === 1 && banks.length > 2)) return 'radial'
  if (cylinders.length === 1) return bore <= 110 ? 'small-single' : null
  if (twoStroke) return null
  const most = operating.maxRpm ?? operating.ratedRpm
  if (compressionRatio >= 14.5 && bore >= 95 && (most ?? 0) < 4000) return 'heavy-diesel'
  if (cylinders.length === 2) return banks.length === 2 && throws.length === 1 ? 'v-twin' : null
  if (most !== undefined && most > 8500 && cylinders.length < 8) return null
  if (most !== undefined && most > 8500) return 'racing'
  return bore <= 115 ? 'car' : null
}

/** What is usual for a document's class, where its class has such a range. */
export function usualRange(document: CrankTrain, name: RangeName): Range | null {
  const kind = engineClassOf(document)
  const column: Partial<Record<EngineClass, Range>> = classRanges[name]
  return (kind && column[kind]) ?? null
}
