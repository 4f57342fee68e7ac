import { clearanceModel, leastGap, statusOf } from '@/lib/mechanics/clearance/clearances'
import { quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { toSi } from '@/lib/units/units'
import type { CrankTrain } from '@/scene/model/crank-train'
import { cylinderValues, fieldPath } from '@/scene/model/cylinder-values'
import { applyChanges, type Change } from '@/scene/model/path'
import { judgeTrain } from '@/scene/model/read-train'
import { toTrain } from '@/scene/model/to-train'
import { clearanceBodies } from './clearance-bodies'
import type { ListedClearance } from './clearance-list'
import { readShape } from './shape'
import type { Rig } from './types'

/** One way to give a pair its limit: said with its figure, and what it changes in the train's document. */
export interface ClearanceMend {
  label: string
  changes: Change[]
}

/** A figure of the document, in mm or degrees, that widens a gap when it goes one way. */
interface Lever {
  verb: string
  from: number
  step: 1 | -1
  /** How far it may go. */
  reach: number
  unit: 'mm' | '°'
  changes(value: number): Change[]
}

/**
 * Mends of a clearance that is not kept: for each lever the nearest whole millimetre or degree from which on the same
 * sweep keeps the limit, where one within reach does and the document that it leads to is not refused.
 */
export function clearanceMends(
  document: CrankTrain,
  rig: Rig,
  { pair, limit }: ListedClearance,
  system: System,
): ClearanceMend[] {
  const keeps = (changes: Change[]) => {
    const changed = applyChanges(document, changes)
    const train = toTrain(changed)
    const { sizes } = clearanceBodies(changed, train, rig)
    return statusOf(leastGap(clearanceModel(train, sizes), pair).gap, limit) === 'clear'
  }
  return leversOf(document, rig, pair).flatMap((lever) => {
    const value = nearest(lever, (at) => keeps(lever.changes(at)))
    if (value === null) return []
    const changes = lever.changes(value)
    if (!judgeTrain(applyChanges(document, changes)).ok) return []
    const figure = quantityText(toSi(value, lever.unit), lever.unit === 'mm' ? 'length' : 'angle', system)
    return [{ label: `${lever.verb} to ${figure}`, changes }]
  })
}

/** The whole number nearest to where the lever stands from which on it keeps; null where none within reach does. */
function nearest({ from, step, reach }: Lever, keeps: (value: number) => boolean): number | null {
  const first = step > 0 ? Math.floor(from) + 1 : Math.ceil(from) - 1
  let [low, high] = [0, Math.floor(reach)]
  if (high < 0 || !keeps(first + step * high)) return null
  while (low < high) {
    const middle = (low + high) >> 1
    if (keeps(first + step * middle)) high = middle
    else low = middle + 1
  }
  return first + step * low
}

function leversOf(document: CrankTrain, rig: Rig, pair: ListedClearance['pair']): Lever[] {
  const train = toTrain(document)
  const shape = readShape(document, train)
  const cylinders = 'other' in pair ? [pair.cylinder, pair.other] : [pair.cylinder]
  const own = cylinders.map((index) => cylinderValues(document, document.cylinders[index]))

  const ofShape = (field: string, verb: string, from: number, step: 1 | -1, reach: number): Lever => ({
    verb,
    from,
    step,
    reach,
    unit: 'mm',
    changes: (value) => [{ path: ['shape', field], value }],
  })
  /** A figure of every cylinder of the pair, wherever it stands: their own, or the common one. */
  const ofCylinders = (field: 'rodLengthMm' | 'boreMm', verb: string, step: 1 | -1, reach: number): Lever => {
    const paths = [...new Set(cylinders.map((index) => fieldPath(document, index, field)))].map(keysOf)
    const values = own.map((values) => values[field])
    const from = step > 0 ? Math.max(...values) : Math.min(...values)
    return {
      verb,
      from,
      step,
      reach: reach * from,
      unit: 'mm',
      changes: (value) => paths.map((path) => ({ path, value })),
    }
  }
  // a link rod's length follows from its master's
  const rod = own.some(({ link }) => link) ? [] : [ofCylinders('rodLengthMm', 'Lengthen the rod', 1, 0.5)]
  const skirtMm = 1000 * shape.skirtBelowPin
  const skirt = ofShape('skirtBelowPinMm', 'Shorten the skirt', skirtMm, -1, skirtMm - 2)
  switch (pair.kind) {
    case 'skirt-counterweight': {
      const { sizes } = clearanceBodies(document, train, rig)
      const radius = 1000 * sizes.counterweights[pair.counterweight]!.radius
      const verb = 'Reduce counterweight radius'
      return [ofShape('counterweightRadiusMm', verb, radius, -1, radius / 2), ...rod, skirt]
    }
    case 'skirt-web':
      return [...rod, skirt]
    case 'bank-bank':
      return [...rod, ...bankLever(document), skirt]
    case 'rod-bore':
      return rod
    case 'piston-deck': {
      const crown = 1000 * shape.compressionHeight
      const deck = document.shape?.deckHeightMm ?? 0
      return [
        ofShape('compressionHeightMm', 'Reduce compression height', crown, -1, crown / 2),
        ofShape('deckHeightMm', 'Raise the deck', deck, 1, deck / 10),
      ]
    }
    case 'bore-wall':
      return [ofCylinders('boreMm', 'Reduce the bore', -1, 0.3)]
    case 'rod-rod':
      return []
  }
}

/** The angle between the two banks of a V, each turned by half of what it changes. */
function bankLever({ banks }: CrankTrain): Lever[] {
  if (banks.length !== 2) return []
  const [a, b] = banks.map(({ angleDeg }) => angleDeg)
  const from = Math.abs(b - a)
  const turned = (value: number) => ((b < a ? -1 : 1) * (value - from)) / 2
  return [
    {
      verb: 'Widen the bank angle',
      from,
      step: 1,
      reach: 170 - from,
      unit: '°',
      changes: (value) => [
        { path: ['banks', 0, 'angleDeg'], value: a - turned(value) },
        { path: ['banks', 1, 'angleDeg'], value: b + turned(value) },
      ],
    },
  ]
}

const keysOf = (path: string) => path.split('.').map((key) => (/^\d+$/.test(key) ? Number(key) : key))
