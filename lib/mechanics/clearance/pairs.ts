import type { Train } from '../train'
import type { ClearanceModel, Stretch } from './sizes'

/** Two bodies whose gap is looked at; the numbers are indices of cylinders, of counterweights and of bare webs. */
export type Pair =
  | { kind: 'skirt-counterweight'; cylinder: number; counterweight: number }
  | { kind: 'skirt-web'; cylinder: number; web: number }
  | { kind: 'bank-bank'; cylinder: number; other: number }
  | { kind: 'rod-bore'; cylinder: number }
  | { kind: 'rod-rod'; cylinder: number; other: number }
  | { kind: 'piston-deck'; cylinder: number }
  | { kind: 'bore-wall'; cylinder: number; other: number }

/** Every pair of a train that can meet. */
export function clearancePairs(model: ClearanceModel): Pair[] {
  const { train, sizes } = model
  return train.cylinders.flatMap((_, cylinder): Pair[] => [
    ...(sizes.pistons[cylinder] ? ofTrunkPiston(model, cylinder) : []),
    ...rodNeighbours(train, cylinder).map((other): Pair => ({ kind: 'rod-rod', cylinder, other })),
    ...boreNeighbour(train, cylinder).map((other): Pair => ({ kind: 'bore-wall', cylinder, other })),
  ])
}

function ofTrunkPiston({ train, sizes }: ClearanceModel, cylinder: number): Pair[] {
  const { axial, bore } = train.cylinders[cylinder]
  const under = ({ from, to }: Stretch) => to > axial - bore / 2 && from < axial + bore / 2
  return [
    ...sizes.counterweights.flatMap((weight, counterweight): Pair[] =>
      weight && under(weight) ? [{ kind: 'skirt-counterweight', cylinder, counterweight }] : [],
    ),
    ...sizes.webs.flatMap((web, index): Pair[] =>
      under(web) ? [{ kind: 'skirt-web', cylinder, web: index }] : [],
    ),
    ...bankNeighbours({ train, sizes }, cylinder).map((other): Pair => ({
      kind: 'bank-bank',
      cylinder,
      other,
    })),
    { kind: 'rod-bore', cylinder },
    ...(sizes.deck === null ? [] : [{ kind: 'piston-deck', cylinder } as const]),
  ]
}

const TURN = 2 * Math.PI
/** Banks nearer than this to each other, or to being opposed, do not count as a V, rad. */
const ONE_BANK = 0.02

/** How far the bank of `other` stands ahead of that of `one`, 0 ≤ x < a turn. */
function ahead({ banks, cylinders }: Train, one: number, other: number): number {
  const turn = (banks[cylinders[other].bank].angle - banks[cylinders[one].bank].angle) % TURN
  return turn < 0 ? turn + TURN : turn
}

/** Pistons next to this one ahead of it in another bank, less than half a turn away, that overlap it along the crank. */
function bankNeighbours({ train, sizes }: Pick<ClearanceModel, 'train' | 'sizes'>, one: number): number[] {
  const { axial, bore } = train.cylinders[one]
  const beside = train.cylinders.flatMap((other, i) => {
    const overlaps = Math.abs(other.axial - axial) < (other.bore + bore) / 2
    const turn = ahead(train, one, i)
    return sizes.pistons[i] && overlaps && turn > ONE_BANK && turn < Math.PI - ONE_BANK ? [i] : []
  })
  const nearest = Math.min(...beside.map((i) => ahead(train, one, i)))
  return beside.filter((i) => ahead(train, one, i) < nearest + ONE_BANK)
}

/** The next rod round one master, ahead of this one; the master itself stands at the angle 0. */
function rodNeighbours({ cylinders }: Train, one: number): number[] {
  const { link } = cylinders[one]
  const master = link ? link.master : one
  const ring = cylinders.flatMap((other, i) => (i === master || other.link?.master === master ? [i] : []))
  if (ring.length < 2) return []
  const angleOf = (i: number) => {
    const angle = (cylinders[i].link?.knuckleAngle ?? 0) % TURN
    return angle < 0 ? angle + TURN : angle
  }
  ring.sort((a, b) => angleOf(a) - angleOf(b))
  const next = ring[(ring.indexOf(one) + 1) % ring.length]
  // two rods are each other's neighbours once
  return ring.length === 2 && ring[0] !== one ? [] : [next]
}

/** The next bore of the same bank towards the drive end. */
function boreNeighbour({ cylinders }: Train, one: number): number[] {
  const { axial, bank } = cylinders[one]
  const after = cylinders.flatMap((other, i) => (other.bank === bank && other.axial > axial ? [i] : []))
  if (after.length === 0) return []
  return [after.reduce((best, i) => (cylinders[i].axial < cylinders[best].axial ? i : best))]
}
