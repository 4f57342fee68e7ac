import type { CrankTrain } from '@/scene/model/crank-train'
import { judge } from './judge'

export interface Fitted {
  document: CrankTrain
  kept: string[]
  reset: string[]
}

/** Values of the engine as a whole, which a change of count or layout leaves as they were. */
const whole = [
  ['bore, stroke, rod, offset and compression', 'cylinderDefaults'],
  ['masses', 'masses'],
  ['balance factor', 'balanceFactor'],
  ['journals and webs', 'shape'],
  ['speeds', 'operating'],
  ['rotation', 'rotation'],
  ['gas', 'gas'],
  ['crankcase pressure', 'crankcasePressureBar'],
  ['engine class', 'engineClass'],
] as const satisfies readonly (readonly [string, keyof CrankTrain])[]

/** Lists whose entries stand on certain throws or cylinders. */
const lists = [
  ['counterweight', 'counterweights'],
  ['balance shaft', 'balanceShafts'],
  ['main', 'mains'],
  ['collector', 'collectors'],
] as const satisfies readonly (readonly [string, keyof CrankTrain])[]

/** What holds for this very crank. */
const ofTheCrank = [
  ['crank mass', 'crankMassKg'],
  ['flywheel and free-end inertia', 'inertia'],
  ['reasons for unusual values', 'acknowledged'],
] as const satisfies readonly (readonly [string, keyof CrankTrain])[]

/**
 * A newly set-out train with everything of the old one that still fits it, and what of the old one does not. Of a cycle
 * of the other kind the gas does not fit; what stands on single throws or cylinders fits only where all of them stand.
 */
export function keepFitting(old: CrankTrain, laid: CrankTrain): Fitted {
  const [kept, reset]: [string[], string[]] = [[], []]
  const sameCycle = old.cycle === laid.cycle
  let document = laid
  for (const [name, key] of whole) {
    if (old[key] === undefined) continue
    if (!sameCycle && (key === 'gas' || key === 'operating')) reset.push(name)
    else {
      document = { ...document, [key]: old[key] }
      kept.push(name)
    }
  }
  const places = (train: CrankTrain) =>
    JSON.stringify([train.throws.map(({ axialMm, angleDeg }) => [axialMm, angleDeg]), train.cylinders.length])
  const unmoved = places(old) === places(laid)
  for (const [name, key] of lists) {
    const count = old[key].length
    if (count === 0) continue
    if (unmoved) document = { ...document, [key]: old[key] }
    ;(unmoved ? kept : reset).push(`${count} ${name}${count === 1 ? '' : 's'}`)
  }
  const ordered = { ...document, firingOrder: old.firingOrder }
  const order = `firing order ${old.firingOrder.join('-')}`
  if (old.firingOrder.length === laid.firingOrder.length && judge(ordered).length === 0) {
    document = ordered
    kept.push(order)
  } else reset.push(`${order}, now ${laid.firingOrder.join('-')}`)
  const own = old.cylinders.filter((cylinder) => ownKeys(cylinder).length > 0)
  const mapped = laid.cylinders.map((cylinder) => {
    const same = old.cylinders.find(({ id, link }) => id === cylinder.id && !link && !cylinder.link)
    const values = same && Object.fromEntries(ownKeys(same).map((key) => [key, same[key]]))
    return { ...cylinder, ...values }
  })
  const gone = own.filter(
    ({ id, link }) => link || !laid.cylinders.some((other) => other.id === id && !other.link),
  )
  if (own.length > gone.length) kept.push(`own values of cylinder ${names(own, gone)}`)
  if (gone.length > 0) reset.push(`own values of cylinder ${gone.map(({ id }) => id).join(', ')}`)
  for (const [name, key] of ofTheCrank) {
    if (old[key] === undefined) continue
    if (unmoved) document = { ...document, [key]: old[key] }
    ;(unmoved ? kept : reset).push(name)
  }
  return { document: { ...document, cylinders: mapped }, kept, reset }
}

type Cylinder = CrankTrain['cylinders'][number]
const standing = new Set(['id', 'bank', 'throw', 'axialMm', 'link', 'firesAtDeg'])
const ownKeys = (cylinder: Cylinder) =>
  (Object.keys(cylinder) as (keyof Cylinder)[]).filter(
    (key) => !standing.has(key) && cylinder[key] !== undefined,
  )
const names = (own: Cylinder[], gone: Cylinder[]) =>
  own
    .filter((cylinder) => !gone.includes(cylinder))
    .map(({ id }) => id)
    .join(', ')
