import type { Complex } from '@/lib/numerics/fourier'
import type { BalanceShaft, Train } from '../train'
import { inertiaScale } from './inertia-scale'
import { complex, nothing, phasor, scaled } from './phasor'
import { exactOrders } from './turning'
import { inTwoPlanes } from './two-planes'

/** What balance shafts are to remove: what turns backward in order 1, or all of order 2; as a force, a couple, or both. */
export interface ShaftWish {
  order: 1 | 2
  remove: 'force' | 'couple' | 'both'
  /** One or two places along the crank, m; a couple needs two. */
  places: readonly number[]
  /** Where the axes lie, m: those that turn with the crank at +horizontal, those against it at −horizontal. */
  horizontal: number
  vertical: number
}

/** Below this share of one cylinder's first-order force there is nothing to remove. */
const NOTHING = 1e-9

/**
 * Balance shafts whose unbalance U·ratio²·ω² answers the wished part of the exact orders: at one place U = −F/ratio²; at
 * two, the statics of two planes. `train` as it stands: what its shafts remove already is not removed again. Throws
 * RangeError for a couple at one place.
 */
export function designShafts(train: Train, wish: ShaftWish, orders = exactOrders(train)): BalanceShaft[] {
  const found = orders.find(({ order }) => order === wish.order)
  if (!found) return []
  const ratios: BalanceShaft['speedRatio'][] = wish.order === 1 ? [-1] : [2, -2]
  const least = NOTHING * inertiaScale(train).force
  const weights = ratios.flatMap((ratio) => {
    const sense = ratio > 0 ? 'forward' : 'backward'
    const target = (kind: 'force' | 'couple') =>
      wish.remove === kind || wish.remove === 'both'
        ? scaled(complex(found[kind][sense]), -1 / (ratio * ratio))
        : nothing
    return atPlaces(train, wish.places, target('force'), target('couple'))
      .filter(({ unbalance }) => phasor(unbalance).size > least)
      .map(({ axial, unbalance }) => ({ ratio, axial, unbalance }))
  })
  const names = freshNames(train.balanceShafts.map(({ id }) => id))
  return weights.map(({ ratio, axial, unbalance }) => {
    const { size, angle } = phasor(unbalance)
    return {
      id: names(),
      speedRatio: ratio,
      angle,
      unbalance: size,
      axial,
      horizontal: ratio > 0 ? wish.horizontal : -wish.horizontal,
      vertical: wish.vertical,
    }
  })
}

function atPlaces(train: Train, places: readonly number[], force: Complex, couple: Complex) {
  const [first, second] = places
  if (places.length < 2 || first === second) {
    if (phasor(couple).size > 0) throw new RangeError('A couple needs weights at two places along the crank.')
    return [{ axial: first, unbalance: force }]
  }
  const [a, b] = inTwoPlanes(force, couple, first - train.referenceAxial, second - train.referenceAxial)
  return [
    { axial: first, unbalance: a },
    { axial: second, unbalance: b },
  ]
}

function freshNames(taken: readonly string[]) {
  let n = 0
  return () => {
    do n++
    while (taken.includes(`S${n}`))
    return `S${n}`
  }
}
