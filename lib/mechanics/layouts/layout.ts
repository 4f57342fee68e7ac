/** What a layout can be wished to have little of; each is 0 at best. */
export const criteria = [
  'firstForce',
  'firstCouple',
  'secondForce',
  'secondCouple',
  'counterweight',
  'unevenness',
  'sameBank',
  'nearThrow',
] as const
export type Criterion = (typeof criteria)[number]

/**
 * One figure a criterion. `firstForce` F1, `firstCouple` F1·a: what the least counterweights leave; `secondForce` F2,
 * `secondCouple` F2·a, `counterweight` m·r: see phasing-balance. `unevenness`: greatest less least firing interval, rad;
 * `sameBank`: firings followed by one on the same bank; `nearThrow`: by one on the same or the next throw.
 */
export type Figures = Record<Criterion, number>

/** `weight` 0 or more counts in the score, default 1; `atMost` shuts out what is above it. */
export interface Wish {
  weight?: number
  atMost?: number
}
export type Wishes = Partial<Record<Criterion, Wish>>

/**
 * Engines of equal cylinders with throws at equal spacing a. Angles in rad. With two banks these stand `bankAngle`
 * apart; each throw carries a rod of either bank (`rodsPerThrow` 2), or one rod, the banks in turn (1).
 */
export interface LayoutRequest {
  /** 1 to 12. */
  cylinders: number
  /** 2π or 4π. */
  cycle: number
  rodsPerThrow: 1 | 2
  /** One entry of each angle to try; empty for one bank. */
  bankAngles: readonly number[]
  /** How far the second bank's pin stands ahead of the first's on one throw; each is tried. [0] for common pins. */
  splits: readonly number[]
  /** Parts of a turn that throws are placed on, beside those that even firing calls for; by the size of the search where absent. */
  divisions?: readonly number[]
  /** Between the two rods of a throw, in a. */
  rodOffset: number
  /** Bob-weights stand for all of what rotates and this share of what reciprocates. */
  balanceFactor: number
  /** What rotates with a rod on its pin (its share of the throw too), as a multiple of m, what reciprocates with it. */
  rotating: number
  wishes: Wishes
}

/** Parts of one order's force or couple that turn with the crank and against it. */
export interface Turning {
  forward: number
  backward: number
}

export interface Layout extends Figures {
  /** null for one bank. */
  bankAngle: number | null
  split: number
  /** Of each throw (its first bank's pin), the first at 0, rad. */
  throwAngles: number[]
  /** Indices of cylinders in firing order from cylinder 0 on. With two rods a throw, throw k carries cylinders 2k and 2k + 1. */
  order: number[]
  /** From each firing in `order` to the next, rad. */
  intervals: number[]
  even: boolean
  sameThrow: number
  /** Orders of this phasing, this one with them, that no criterion tells apart. */
  alike: number
  /** Of the bare reciprocating masses: F1, F1·a, F2, F2·a. */
  force1: Turning
  couple1: Turning
  force2: Turning
  couple2: Turning
  /** All least counterweights together, m·r. */
  counterweights: number
  /** Sum of weight × figure / scale over the wishes; `rest` the same over all else with weight 1. Less is better. */
  score: number
  rest: number
  /** No layout found is better in one wished criterion without being worse in another, by a hundredth of its scale. */
  foremost: boolean
}
