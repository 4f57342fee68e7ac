import { wrap, wrapCentred } from '@/lib/numerics/wrap'
import { deadCentres } from './dead-centres'
import { EVEN_WITHIN } from './firing'
import { rodPaths } from './rod-path'
import type { Train } from './train'

const TURN = 2 * Math.PI

/** Angles of all throws; or two cylinders whose common throw would have to stand in two places, `apart` from each other. */
export type Phasing =
  | { ok: true; throwAngles: number[] }
  | { ok: false; throw: number; cylinders: [number, number]; apart: number }

/**
 * The throw angles with which a train fires in a wanted order: φ = β − F mod 2π for a cylinder on bank β that fires at F,
 * and by as much more as its top dead centre is shifted by an offset or a link rod. The throw of the order's first
 * cylinder stays where it is, and so does one without cylinders; angles 0 ≤ φ < 2π.
 * Cylinders of one throw must want it in one place, within half a degree.
 * `order`: indices of cylinders, each once. `intervals`: rad, from each cylinder of the order to the next, the sum
 * being the cycle; even where left out. Bank angles stay.
 */
export function phasingFromOrder(
  train: Train,
  order: readonly number[],
  intervals: readonly number[] = order.map(() => train.cycle / order.length),
): Phasing {
  const centres = deadCentres(rodPaths(train))
  /** By how much the throw of each cylinder of the order must turn. */
  const turns = new Map<number, { cylinder: number; by: number }[]>()
  let fires = 0
  const start = centres[order[0]].top
  order.forEach((cylinder, place) => {
    const pin = train.cylinders[cylinder].throw
    const by = centres[cylinder].top - start - fires
    turns.set(pin, [...(turns.get(pin) ?? []), { cylinder, by }])
    fires += intervals[place]
  })
  const throwAngles = train.throws.map(({ angle }) => wrap(angle, TURN))
  for (const [pin, wanted] of turns) {
    const [first] = wanted
    const off = wanted.map(({ by }) => wrapCentred(by - first.by, TURN))
    const far = off.findIndex((angle) => Math.abs(angle) > EVEN_WITHIN)
    if (far >= 0)
      return {
        ok: false,
        throw: pin,
        cylinders: [first.cylinder, wanted[far].cylinder],
        apart: Math.abs(off[far]),
      }
    const mean = off.reduce((sum, angle) => sum + angle, 0) / off.length
    throwAngles[pin] = wrap(throwAngles[pin] + first.by + mean, TURN)
  }
  return { ok: true, throwAngles }
}

/** The order of the mirrored crank, or of the same crank turning the other way: backwards from its first cylinder. */
export const mirroredOrder = <T>([first, ...rest]: readonly T[]): T[] => [first, ...rest.reverse()]
