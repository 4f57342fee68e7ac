import { massSplit } from '../balance'
import type { Train } from '../train'
import type { BalanceOrder } from './turning'

/** The units of a balancing table for a train, at 1 rad/s: one mean cylinder's first-order force, and its rod's ratio. */
export interface InertiaScale {
  /** F1 = m·r, kg m: mean reciprocating mass × mean throw radius. */
  force: number
  /** λ = r/l of the mean throw and rod. */
  ratio: number
  /** a: mean distance between neighbouring throws, m; null where all stand at one place. */
  spacing: number | null
  /** All reciprocating masses, throw radii, rods and spacings are alike: the coefficients are those of the tables. */
  alike: boolean
}

const ALIKE = 1e-6

export function inertiaScale(train: Train): InertiaScale {
  const masses = train.cylinders.map((cylinder) => massSplit(cylinder).reciprocating)
  const radii = train.cylinders.map((cylinder) => train.throws[cylinder.throw].radius)
  const rods = train.cylinders.map(({ rodLength }) => rodLength)
  const places = [...new Set(train.throws.map(({ axial }) => axial))].sort((a, b) => a - b)
  const gaps = places.slice(1).map((place, i) => place - places[i])
  return {
    force: mean(masses) * mean(radii),
    ratio: mean(radii) / mean(rods),
    spacing: gaps.length > 0 ? mean(gaps) : null,
    alike: [masses, radii, rods, gaps].every(same) && train.cylinders.every(({ link }) => !link),
  }
}

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length
const same = (values: readonly number[]) =>
  values.every((value) => Math.abs(value - values[0]) <= ALIKE * values[0])

/**
 * The textbook's first term of one order of a cylinder's inertia force in units of F1: 1, λ, −λ³/4, 9λ⁵/128 for orders
 * 1, 2, 4, 6 (binomial expansion of the slider-crank; any engine dynamics text).
 */
export function firstTerm(order: BalanceOrder, ratio: number): number {
  switch (order) {
    case 1:
      return 1
    case 2:
      return ratio
    case 4:
      return -(ratio ** 3) / 4
    case 6:
      return (9 * ratio ** 5) / 128
  }
}
