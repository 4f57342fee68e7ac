import { formatNumber, plainNumber, withUnit } from '@/lib/units/format'
import { scaleFor, type Quantity, type System } from '@/lib/units/quantities'
import { convert, toSi, type UnitName } from '@/lib/units/units'
import type { CrankTrain } from '@/scene/model/crank-train'
import { cylinderValues } from '@/scene/model/cylinder-values'
import type { Scene } from '@/scene/model/scene'
import type { Mend } from './field'
import { fitOrder, topCentres } from './fit-order'
import type { Issue } from './judge'
import { applyChanges, inTrain, type Change } from './path'

interface Attempt {
  /** The field that was typed in, and the changes that were refused. */
  key: string
  changes: Change[]
  scene: Scene
  system: System
}

const needsOrder = /^(firingOrder|throws|banks|bankAngle|cycle|cylinders\.\d+\.(bank|throw))/

/** One way out of a refusal, where there is one: the value that would do, or what would have to go with it. */
export function mendsFor(issues: readonly Issue[], attempt: Attempt): Mend[] {
  const [{ code, path }] = issues
  const train = applyChanges(attempt.scene, attempt.changes).train
  switch (code) {
    case 'rod-too-short':
      return rodMend(train, attempt)
    case 'strokes-disagree':
      return strokeMend(train, attempt)
    case 'centre-of-gravity-outside':
      return centreMend(train, attempt)
    case 'speeds-out-of-order':
      return speedMend(train, attempt)
    case 'not-a-top-dead-centre':
      return firingAngleMends(train, Number(path.split('.')[1]))
    case 'out-of-range':
      return /firesAtDeg$/.test(path) ? firingAngleMends(train, Number(path.split('.')[1])) : []
    default:
      return needsOrder.test(attempt.key) && /firing-order|^unknown-cylinder$/.test(code)
        ? orderMend(train, attempt)
        : []
  }
}

/** "66 mm", in the unit of the sheet; `side` says which way rounding may go. */
function text(value: number, unit: UnitName, quantity: Quantity, system: System, side: 'up' | 'down') {
  const { unit: shown } = scaleFor(toSi(value, unit), quantity, system)
  const step = shown === 'in' ? 0.01 : 1
  const count = convert(value, unit, shown) / step
  const whole = side === 'up' ? Math.floor(count + 1 + 1e-9) : Math.ceil(count - 1 - 1e-9)
  return withUnit(plainNumber(whole * step), shown)
}

function rodMend(train: CrankTrain, { key, changes, scene, system }: Attempt): Mend[] {
  const own = train.cylinders.find((cylinder) => {
    const { rodLengthMm, strokeMm, offsetMm } = cylinderValues(train, cylinder)
    return !cylinder.link && rodLengthMm <= strokeMm / 2 + Math.abs(offsetMm)
  })
  if (!own) return []
  const { rodLengthMm: rod, strokeMm: stroke, offsetMm: offset } = cylinderValues(train, own)
  const least = stroke / 2 + Math.abs(offset)
  if (/offsetMm$/.test(key)) {
    const value = text(rod - stroke / 2, 'mm', 'length', system, 'down')
    return rod > stroke / 2 ? [{ label: `Use offset ${value}`, text: value }] : []
  }
  if (/strokeMm$/.test(key) && own.rodLengthMm === undefined) {
    const before = cylinderValues(scene.train, scene.train.cylinders[0])
    const kept = Number(((before.rodLengthMm / before.strokeMm) * stroke).toFixed(1))
    const longer = formatNumber(kept, { decimals: 1 })
    return [
      {
        label: `Use rod ${longer} mm with it`,
        changes: [...changes, { path: ['train', 'cylinderDefaults', 'rodLengthMm'], value: kept }],
      },
    ]
  }
  const value = text(least, 'mm', 'length', system, 'up')
  return [{ label: `Use rod ${value}`, text: value }]
}

/** The typed stroke for every cylinder that shares the throw. */
function strokeMend(train: CrankTrain, { key, changes }: Attempt): Mend[] {
  const typed = train.cylinders[Number(key.split('.')[1])]
  if (!typed) return []
  const sharing = train.cylinders.flatMap((cylinder, index) =>
    cylinder.throw === typed.throw && cylinder !== typed ? [index] : [],
  )
  const more = inTrain(
    sharing.map((index) => ({ path: ['cylinders', index, 'strokeMm'], value: typed.strokeMm })),
  )
  return [{ label: `Use it for all on throw ${typed.throw}`, changes: [...changes, ...more] }]
}

/** At 0.28 of the rod, where most rods have it. */
function centreMend(train: CrankTrain, { key, system }: Attempt): Mend[] {
  if (!/cgFromBigEndMm$/.test(key)) return []
  const { rodLengthMm } = cylinderValues(train, train.cylinders[0])
  const value = text(0.28 * rodLengthMm, 'mm', 'length', system, 'up')
  return [{ label: `Use ${value}, 0.28 of the rod`, text: value }]
}

/** A nought too many or too few, else the next speed that is in order. */
function speedMend({ operating = {} }: CrankTrain, { key }: Attempt): Mend[] {
  const { idleRpm: idle = 0, ratedRpm: rated, maxRpm: most = Infinity } = operating
  const spans: Record<string, { typed?: number; low: number; high: number }> = {
    idleRpm: { typed: idle, low: 0.02 * (rated ?? most), high: 0.6 * (rated ?? most) },
    'operating.ratedRpm': { typed: rated, low: idle, high: most },
    maxRpm: { typed: most, low: rated ?? idle, high: 3 * (rated ?? idle) },
  }
  const span = spans[key]
  if (!span?.typed) return []
  const { typed, low, high } = span
  const found =
    [typed / 10, typed * 10].find((value) => value > low && value <= high) ?? (typed > high ? high : low)
  const value = withUnit(formatNumber(Math.round(found), { decimals: 0 }), 'rpm')
  return [{ label: `Use ${value}`, text: value }]
}

function firingAngleMends(train: CrankTrain, cylinder: number): Mend[] {
  const at = topCentres(train)[cylinder]?.at
  if (at === undefined) return []
  return (train.cycle === 'two-stroke' ? [at] : [at, at + 360]).map((angle) => {
    const value = withUnit(plainNumber(angle), '°')
    return { label: `Use ${value}`, text: value }
  })
}

function orderMend(train: CrankTrain, { key, changes }: Attempt): Mend[] {
  const order = fitOrder(train)
  const label = `Use order ${order.join('-')}`
  if (key === 'firingOrder') return [{ label, text: order.join('-') }]
  return [{ label, changes: [...changes, { path: ['train', 'firingOrder'], value: order }] }]
}
