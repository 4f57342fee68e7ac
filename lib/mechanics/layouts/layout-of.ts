import { EVEN_WITHIN } from '../firing'
import { leastCounterweights } from './counterweights'
import { criteria, type Figures, type Layout, type LayoutRequest } from './layout'
import { balanceOf, webPlaces } from './phasing-balance'
import { orderSearch } from './phasing-orders'
import type { FoundLayout } from './phasing-visitor'
import { pinAngle, type Space } from './space'

const TURN = 2 * Math.PI

/** A found layout with every figure worked out. */
export function layoutOf(request: LayoutRequest, found: FoundLayout, foremost: boolean): Layout {
  const { space, units, late, sameThrow, alike, score, rest } = found
  const { force1, couple1, force2, couple2 } = balanceOf(space, request)(units)
  const { order, intervals } = orderSearch(space).orderOf(units, late)
  const mean = space.cycle / space.cylinders
  return {
    ...(Object.fromEntries(criteria.map((criterion) => [criterion, found[criterion]])) as Figures),
    bankAngle: space.bankAngle,
    split: space.split,
    throwAngles: Array.from(units, (unit, k) => {
      const angle = pinAngle(space, k, unit)
      return angle - TURN * Math.floor(angle / TURN + 1e-9)
    }),
    order,
    intervals,
    even: intervals.every((interval) => Math.abs(interval - mean) <= EVEN_WITHIN),
    sameThrow,
    alike,
    force1,
    couple1,
    force2,
    couple2,
    counterweights: allCounterweights(request, space, units),
    score,
    rest,
    foremost,
  }
}

function allCounterweights(request: LayoutRequest, space: Space, units: Int32Array): number {
  const { throws, rodsPerThrow } = space
  const bob = request.rotating + request.balanceFactor
  const pins = Array.from(units).flatMap((unit, k) =>
    Array.from({ length: rodsPerThrow }, (_, rod) => {
      const angle = pinAngle(space, k, unit, rod)
      const aside = rodsPerThrow === 2 ? (rod - 0.5) * request.rodOffset : 0
      return {
        place: k - (throws - 1) / 2 + aside,
        moment: { re: bob * Math.cos(angle), im: bob * Math.sin(angle) },
      }
    }),
  )
  return leastCounterweights(pins, webPlaces(throws)).reduce((sum, { re, im }) => sum + Math.hypot(re, im), 0)
}
