import { wrap } from '@/lib/numerics/wrap'
import { EVEN_WITHIN } from '../firing'
import { SAME } from '../firing-choice'
import type { LayoutRequest } from './layout'

const TURN = 2 * Math.PI

/** One bank angle, one split and one grid: throw k can stand at `offsets[k]` + u·turn/`divisions`, u whole. */
export interface Space {
  cylinders: number
  cycle: number
  rodsPerThrow: 1 | 2
  throws: number
  bankAngle: number | null
  split: number
  divisions: number
  /** Grid that even firing calls for, rather than a regular one. */
  natural: boolean
  offsets: number[]
  /** Relations that turn a phasing into one with the same figures, of those that stay in this space. */
  symmetry: { mirror: boolean; endForEnd: boolean; both: boolean }
}

/** Angle of the bank of a cylinder from straight up: half the bank angle to either side. */
export const bankOf = ({ rodsPerThrow, bankAngle }: Space, throwIndex: number, rod: number): 0 | 1 =>
  bankAngle === null ? 0 : rodsPerThrow === 2 ? (rod as 0 | 1) : throwIndex % 2 === 0 ? 0 : 1
export const bankAngleOf = (space: Space, bank: 0 | 1): number =>
  space.bankAngle === null ? 0 : (bank - 0.5) * space.bankAngle
export const pinAngle = (space: Space, throwIndex: number, unit: number, rod = 0): number =>
  space.offsets[throwIndex] + (TURN * unit) / space.divisions + rod * space.split

/** Top dead centre from the first cylinder's, 0 ≤ x < 2π, without offset: θ = β − φ. */
export const topCentre = (space: Space, throwIndex: number, unit: number, rod: number): number =>
  wrap(
    bankAngleOf(space, bankOf(space, throwIndex, rod)) -
      bankAngleOf(space, 0) -
      pinAngle(space, throwIndex, unit, rod),
    TURN,
  )

/** Parts of a turn that top dead centres of evenly firing cylinders stand on, and how many cylinders on each. */
export function evenSlots({ cylinders, cycle }: Pick<LayoutRequest, 'cylinders' | 'cycle'>) {
  const shared = cycle > TURN * 1.5 && cylinders % 2 === 0 ? 2 : 1
  return { slots: cylinders / shared, capacity: shared }
}

const REGULAR = [72, 36, 24, 12, 8, 6, 4, 3, 2]
/** Phasings of one regular grid, over all bank angles and splits, that a search takes on by itself. */
const COMFORTABLE = 60_000

/** Divisions of the regular grids: asked for, or every grid of 5° to 180° that is small enough and not part of a finer one. */
export function regularDivisions(request: LayoutRequest): number[] {
  const wanted = request.divisions ?? REGULAR.filter((n) => gridSize(request, n) <= COMFORTABLE)
  return wanted.filter((n) => !wanted.some((finer) => finer > n && finer % n === 0))
}

const throwsOf = ({ cylinders, rodsPerThrow }: LayoutRequest) => cylinders / rodsPerThrow
const variants = ({ bankAngles, splits }: LayoutRequest) => Math.max(1, bankAngles.length) * splits.length
const gridSize = (request: LayoutRequest, divisions: number) =>
  variants(request) * divisions ** (throwsOf(request) - 1)

/** How many phasings a search goes through at most, before any are pruned: those that even firing calls for, and regular grids. */
export function searchSize(request: LayoutRequest): { natural: number; regular: number } {
  const { slots, capacity } = evenSlots(request)
  const factorial = (n: number): number => (n < 2 ? 1 : n * factorial(n - 1))
  const arrangements = factorial(request.cylinders) / capacity ** slots / slots
  return {
    natural: variants(request) * Math.min(arrangements, slots ** (throwsOf(request) - 1)),
    regular: regularDivisions(request).reduce((sum, n) => sum + gridSize(request, n), 0),
  }
}

/** Every bank angle and split with every grid. */
export function spaces(request: LayoutRequest): Space[] {
  const { cylinders, cycle, rodsPerThrow, splits } = request
  const throws = throwsOf(request)
  const { slots } = evenSlots(request)
  const regular = regularDivisions(request)
  const angles = request.bankAngles.length > 0 ? request.bankAngles : [null]
  return angles.flatMap((bankAngle) =>
    splits.flatMap((split) => {
      const inTurn = bankAngle !== null && rodsPerThrow === 1
      const base = { cylinders, cycle, rodsPerThrow, throws, bankAngle, split }
      const symmetry = symmetryOf(request, bankAngle)
      const space = (divisions: number, natural: boolean): Space => ({
        ...base,
        divisions,
        natural,
        offsets: Array.from({ length: throws }, (_, k) => (natural && inTurn && k % 2 === 1 ? bankAngle : 0)),
        symmetry,
      })
      return [space(slots, true), ...regular.map((divisions) => space(divisions, false))]
    }),
  )
}

/**
 * Mirrored left to right the crank turns the other way and its order is read backwards; end for end its throws are counted
 * from the other end. With one rod a throw and banks in turn only what brings a first-bank cylinder to the front stays in
 * the space; banks opposite each other can be exchanged by turning the engine over.
 */
function symmetryOf({ rodsPerThrow, rodOffset, cylinders }: LayoutRequest, bankAngle: number | null) {
  if (bankAngle === null) return { mirror: true, endForEnd: true, both: true }
  const opposite = wrap(2 * bankAngle + SAME, TURN) <= 2 * SAME
  if (rodsPerThrow === 2) {
    const level = rodOffset === 0 || opposite
    return { mirror: level, endForEnd: level, both: true }
  }
  return {
    mirror: opposite,
    endForEnd: opposite || cylinders % 2 === 1,
    both: opposite || cylinders % 2 === 0,
  }
}

/**
 * For each throw, step of the grid and rod: the class of its top dead centre, at `(throw·divisions + step)·rods + rod`;
 * −1 where none may stand. No more than `capacity` cylinders can be in one class.
 * With `even`, classes are the slots of an even engine; otherwise top dead centres that coincide.
 */
export function centreClasses(space: Space, even: boolean) {
  const { throws, divisions, rodsPerThrow: rods } = space
  const { slots, capacity } = evenSlots(space)
  const turns = Math.round(space.cycle / TURN)
  const of = new Int16Array(throws * divisions * rods)
  const known: number[] = []
  for (let k = 0; k < throws; k++)
    for (let unit = 0; unit < divisions; unit++)
      for (let rod = 0; rod < rods; rod++) {
        const top = topCentre(space, k, unit, rod)
        const place = (k * divisions + unit) * rods + rod
        if (even) {
          const slot = Math.round((top * slots) / TURN)
          of[place] = Math.abs(top - (slot * TURN) / slots) <= EVEN_WITHIN ? slot % slots : -1
        } else {
          const away = (other: number) => wrap(top - other + SAME, TURN) <= 2 * SAME
          const found = known.findIndex(away)
          of[place] = found >= 0 ? found : known.push(top) - 1
        }
      }
  return { of, count: even ? slots : known.length, capacity: even ? capacity : turns }
}
