import { carriedBy } from './lever-rule'
import type { Train } from './train'

/**
 * What is fixed in the crank and out of balance: mass × radius of throws and counterweights as phasors at θ = 0, in the
 * whole, as a couple about the reference place, and shared out to the mains. kg m, kg m².
 */
export interface CrankUnbalance {
  vertical: number
  horizontal: number
  coupleVertical: number
  coupleHorizontal: number
  mainVertical: Float64Array
  mainHorizontal: Float64Array
}

/** Unbalances of the bare crank: each throw's own, and the counterweights. */
export const crankUnbalances = (train: Train) => [
  ...train.throws.map(({ angle, axial, unbalance }) => ({ angle, axial, unbalance })),
  ...train.counterweights.map(({ angle, axial, mass, radius }) => ({
    angle,
    axial,
    unbalance: mass * radius,
  })),
]

export function crankUnbalance(train: Train): CrankUnbalance {
  const { mains, referenceAxial } = train
  const sum: CrankUnbalance = {
    vertical: 0,
    horizontal: 0,
    coupleVertical: 0,
    coupleHorizontal: 0,
    mainVertical: new Float64Array(mains.length),
    mainHorizontal: new Float64Array(mains.length),
  }
  for (const { angle, axial, unbalance } of crankUnbalances(train)) {
    const vertical = unbalance * Math.cos(angle)
    const horizontal = unbalance * Math.sin(angle)
    sum.vertical += vertical
    sum.horizontal += horizontal
    sum.coupleVertical += (axial - referenceAxial) * vertical
    sum.coupleHorizontal += (axial - referenceAxial) * horizontal
    if (mains.length < 2) continue
    const { first, share } = carriedBy(mains, axial)
    sum.mainVertical[first] += (1 - share) * vertical
    sum.mainHorizontal[first] += (1 - share) * horizontal
    sum.mainVertical[first + 1] += share * vertical
    sum.mainHorizontal[first + 1] += share * horizontal
  }
  return sum
}
