import { circle, eggOutline, type Outline } from '../mesh/outline'
import type { Shape } from '../shape'

/** Half the web's least depth below the crank axis, as a multiple of the journal's radius (common practice). */
const bossOf = (shape: Shape) => (shape.builtUp ? 1.5 : 1.14) * shape.mainRadius

/** The webs of a built-up crank are full round discs where they are wide enough to hold the pin. */
export const isDisc = (shape: Shape, throwRadius: number) =>
  shape.builtUp && shape.webWidth / 2 >= throwRadius + shape.pinRadius

/**
 * Outline of a web in the coordinates of its throw (y along the throw): the hull of a round of the web's width,
 * set towards the pin as far as the journal's boss allows, and of the boss round the pin.
 */
export function webOutline(shape: Shape, throwRadius: number): Outline {
  const boss = bossOf(shape)
  const round = Math.max(shape.webWidth / 2, boss)
  if (isDisc(shape, throwRadius)) return circle(0, 0, round)
  const lift = Math.min(round - boss, throwRadius / 2)
  const eye = Math.min(Math.max(1.26 * shape.pinRadius, 0.72 * round), round)
  return eggOutline(lift, round, throwRadius, eye)
}

/** Where the ray at this angle from the crank axis leaves a convex outline that holds the axis. */
export function radiusAt(outline: Outline, angle: number): number {
  const cos = Math.cos(angle)
  const sin = Math.sin(angle)
  for (let i = 0; i < outline.length; i += 2) {
    const j = (i + 2) % outline.length
    // signed distances of the edge's ends from the ray's line
    const a = cos * outline[i + 1] - sin * outline[i]
    const b = cos * outline[j + 1] - sin * outline[j]
    if (a > 0 || b <= 0) continue
    const t = a / (a - b)
    return (
      cos * (outline[i] + t * (outline[j] - outline[i])) +
      sin * (outline[i + 1] + t * (outline[j + 1] - outline[i + 1]))
    )
  }
  return 0
}

/** A web that carries its counterweight flush: what is left of it outside the sector and inside its inner radius. */
export function webBesideSector(outline: Outline, from: number, to: number, inner: Outline): Outline {
  const span = to - from
  const outside: { turn: number; x: number; y: number }[] = []
  for (let i = 0; i < outline.length; i += 2) {
    const turn = wrap(Math.atan2(outline[i + 1], outline[i]) - to)
    if (turn > 1e-6 && turn < 2 * Math.PI - span - 1e-6)
      outside.push({ turn, x: outline[i], y: outline[i + 1] })
  }
  outside.sort((a, b) => a.turn - b.turn)
  const onRay = (angle: number) => {
    const radius = radiusAt(outline, angle)
    return [radius * Math.cos(angle), radius * Math.sin(angle)]
  }
  return [...inner, ...onRay(to), ...outside.flatMap(({ x, y }) => [x, y]), ...onRay(from)]
}

function wrap(angle: number): number {
  const rest = angle % (2 * Math.PI)
  return rest < 0 ? rest + 2 * Math.PI : rest
}
