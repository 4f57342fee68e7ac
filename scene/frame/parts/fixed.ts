import { addLathe } from '../mesh/lathe'
import type { MeshBuilder } from '../mesh/mesh-builder'
import { arc, through } from '../mesh/outline'
import { addPrism } from '../mesh/prism'

export interface LinerSize {
  bore: number
  wall: number
  bottom: number
  deck: number
}

/** Chords to a liner's whole turn, and those that stand: the side away from the viewer. */
export const LINER_STEPS = 32
const WALL_STEPS = 14

/**
 * A liner cut away, with its flange at the deck; y is up the cylinder. `opening` is the step of its turn, from z towards
 * x, at the middle of what is cut away.
 */
export function addLiner(builder: MeshBuilder, { bore, wall, bottom, deck }: LinerSize, opening: number) {
  const inner = bore / 2
  const outer = inner + wall
  const flange = outer + 0.9 * wall
  const step = deck - Math.min(0.09 * bore, 0.2 * (deck - bottom))
  addLathe(builder, {
    profile: through(
      [inner, bottom],
      [outer, bottom],
      [outer, step],
      [flange, step],
      [flange, deck],
      [inner, deck],
    ),
    steps: LINER_STEPS,
    sector: { first: opening + (LINER_STEPS - WALL_STEPS) / 2, count: WALL_STEPS },
  })
}

/** The lower half of a main bearing: the cap with its two feet at the joint. */
export function addMainBearing(builder: MeshBuilder, journal: number, from: number, to: number) {
  const bore = 1.03 * journal
  const outer = 1.36 * journal
  const foot = 1.78 * journal
  const depth = 0.42 * journal
  const start = Math.asin((1.25 * depth) / outer)
  addPrism(builder, {
    outline: [
      ...through([-foot, 0], [-foot, -depth]),
      ...arc(0, 0, outer, Math.PI + start, 2 * Math.PI - start, 32),
      ...through([foot, -depth], [foot, 0]),
      ...arc(0, 0, bore, 2 * Math.PI, Math.PI, 32),
    ],
    from,
    to,
  })
}
