import { rodAngleAt } from '../link-rod'
import type { RodPath } from '../rod-path'
import { placed, separation } from './separation'
import type { ClearanceModel, RodBody, Solid } from './sizes'

/**
 * Between two rods that run in one plane on one master rod, at crank angle θ, m: their shanks and eyes by the
 * separating-axis test, the least of any two. Of the master's own big end only the hub round the crank pin counts: link rods
 * run between its flanges.
 */
export function rodBesideRod(model: ClearanceModel, one: number, other: number) {
  const a = piecesOf(model.sizes.rods[one])
  const b = piecesOf(model.sizes.rods[other])
  return (theta: number) => {
    const ours = a.map(standAt(model, one, theta))
    const theirs = b.map(standAt(model, other, theta))
    let least = Infinity
    for (const own of ours)
      for (const their of theirs) {
        const [x, y] = [own.x - their.x, own.y - their.y]
        // farther apart than the least so far, whatever their shapes
        if (Math.hypot(x, y) - own.reach - their.reach < least)
          least = Math.min(least, separation(own.solid, their.solid))
      }
    return least
  }
}

/** A piece of a rod with the circle round it. */
interface Piece {
  solid: Solid
  x: number
  y: number
  reach: number
}

/** Places of the shank that one piece spans. A shank widens towards its eye ever faster, so that a chord lies outside it. */
const SPAN = 2

/** An eye and the pieces of a shank, along the rod from its big end. */
function piecesOf({ shank, eye }: RodBody): Piece[] {
  const ends = shank.filter((_, i) => i % SPAN === 0 || i === shank.length - 1)
  const pieces = ends.slice(1).map((to, i): Piece => {
    const from = ends[i]
    return {
      solid: {
        points: Float64Array.of(
          ...[from.along, -from.half, to.along, -to.half],
          ...[to.along, to.half, from.along, from.half],
        ),
        round: 0,
      },
      x: (from.along + to.along) / 2,
      y: 0,
      reach: Math.hypot((to.along - from.along) / 2, Math.max(from.half, to.half)),
    }
  })
  return [{ solid: { points: Float64Array.of(0, 0), round: eye }, x: 0, y: 0, reach: eye }, ...pieces]
}

/** Puts a piece of a rod where the rod stands, in the plane (up, towards +90°). */
function standAt({ paths }: ClearanceModel, index: number, theta: number) {
  const path = paths[index]
  const turn = path.bank - rodAngleAt(paths, index, theta)
  const [up, across] = bigEnd(paths, path, theta)
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)]
  return ({ solid, x, y, reach }: Piece): Piece => ({
    solid: placed(solid, cos, sin, up, across),
    x: cos * x - sin * y + up,
    y: sin * x + cos * y + across,
    reach,
  })
}

/** The crank pin's centre, or the knuckle's. */
function bigEnd(paths: readonly RodPath[], path: RodPath, theta: number): [number, number] {
  const pin = theta + path.phase + path.bank
  const at: [number, number] = [path.radius * Math.cos(pin), path.radius * Math.sin(pin)]
  if (path.master < 0) return at
  const knuckle = path.bank + path.knucklePhase - rodAngleAt(paths, path.master, theta)
  return [at[0] + path.knuckleRadius * Math.cos(knuckle), at[1] + path.knuckleRadius * Math.sin(knuckle)]
}
