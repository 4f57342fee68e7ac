import { wrap } from '@/lib/numerics/wrap'
import { deadCentres } from './dead-centres'
import { SAME } from './firing-choice'
import { rodPaths } from './rod-path'
import type { Train } from './train'

const TURN = 2 * Math.PI

/** One way in which an order can fire: angles 0 ≤ x < cycle and intervals, by place in the order; rad. */
export interface FiringTurns {
  angles: number[]
  intervals: number[]
}

/**
 * Every choice of turns that keeps an order, most even first (least sum of squared intervals; an analysis takes the first, or
 * one of those that tie with it, where no angles are stated). The order fixes the least angle from each top dead centre to the next; a turn of the
 * cycle that is left over can be spent at any of them, so an order has one choice, or as many as it has cylinders.
 * Cylinders of one top dead centre fire a turn apart here. Empty for an order that cannot be.
 */
export function firingTurns(train: Train, order: readonly number[]): FiringTurns[] {
  const tops = deadCentres(rodPaths(train)).map(({ top }) => top)
  const least = order.map((cylinder, place) => {
    const step = wrap(tops[order[(place + 1) % order.length]] - tops[cylinder], TURN)
    return step <= SAME || step >= TURN - SAME ? TURN : step
  })
  const left = Math.round((train.cycle - least.reduce((sum, step) => sum + step, 0)) / TURN)
  if (left < 0) return []
  const ways = left === 0 ? [least] : least.map((_, spent) => least.with(spent, least[spent] + left * TURN))
  const square = (intervals: number[]) => intervals.reduce((sum, interval) => sum + interval ** 2, 0)
  return ways
    .toSorted((one, other) => square(one) - square(other))
    .map((intervals) => {
      let angle = tops[order[0]]
      const angles = intervals.map((interval) => {
        const at = wrap(angle, train.cycle)
        angle += interval
        return at
      })
      return { angles, intervals }
    })
}
