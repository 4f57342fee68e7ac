import type { NamedPath } from '@/scene/model/differences'
import type { Part, PartKind, Rig } from './types'

/** The kinds of part that a field is about, where it is not about the whole engine. */
const kinds: Record<string, PartKind[]> = {
  boreMm: ['liner'],
  strokeMm: ['web'],
  rodLengthMm: ['rod'],
  offsetMm: ['liner'],
  compressionRatio: ['piston'],
  pistonKg: ['piston'],
  pistonPinKg: ['piston-pin'],
  ringsKg: ['ring'],
  locksKg: ['piston-pin'],
  rod: ['rod', 'rod-cap'],
  bigEndBearingKg: ['rod-cap'],
  oilAllowanceKg: ['rod-cap'],
  pinDiaMm: ['crank-pin'],
  pinBoreMm: ['crank-pin'],
  pinLengthMm: ['crank-pin'],
  mainDiaMm: ['main-journal'],
  mainBoreMm: ['main-journal'],
  mainLengthMm: ['main-journal'],
  webThicknessMm: ['web'],
  webWidthMm: ['web'],
  counterweightRadiusMm: ['counterweight'],
  compressionHeightMm: ['piston'],
  skirtBelowPinMm: ['piston'],
  deckHeightMm: ['liner'],
  flywheelKgM2: ['flywheel'],
  freeEndKgM2: ['free-end'],
}

/** Which parts carry the name of an entry in a list. */
const named: Record<string, PartKind[]> = {
  cylinders: ['piston', 'piston-pin', 'ring', 'rod', 'rod-cap', 'liner'],
  throws: ['crank-pin'],
  counterweights: ['counterweight'],
  mains: ['main-journal', 'main-bearing'],
  balanceShafts: ['balance-shaft'],
}

/** The drawn parts that a place of a scene's document is about: "train/counterweights/#4D/radiusMm" is counterweight 4D. */
export function partsOfPath(path: NamedPath, rig: Rig): string[] {
  const field = path.map((step) => kinds[step]).find((found) => found !== undefined)
  const [part, list, entry] = path
  if (part !== 'train') return []
  if (entry?.startsWith('#') && list in named) {
    const ids = named[list].filter((kind) => !field || !named[list].some((own) => field.includes(own)) || field.includes(kind)) // prettier-ignore
    const wanted = new Set(ids.map((kind) => `${kind}:${entry.slice(1)}`))
    return idsOf(rig, ({ id }) => wanted.has(id))
  }
  return field ? idsOf(rig, ({ kind }) => field.includes(kind)) : []
}

const idsOf = (rig: Rig, holds: (part: Part) => boolean) =>
  rig.parts.flatMap((part) => (holds(part) ? [part.id] : []))
