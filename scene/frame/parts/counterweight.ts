import { arc, areaMoments, type Outline } from '../mesh/outline'
import { STEEL } from '../shape'

/** A sector about the crank axis: half its angle, its inner and outer radius, and how well it stands for the figures. */
export interface CounterweightSector {
  halfAngle: number
  inner: number
  outer: number
  /** Mass and centre-of-gravity radius of the drawn sector with its rounded corners, in the given thickness. */
  mass: number
  radius: number
  /** The wanted mass or radius does not go into the room: drawn as near as it goes. */
  capped: boolean
}

const CORNER_ROUND = 0.16
const WIDEST = 0.93 * Math.PI
const LEAST = 0.02
/** Drawn this near, a centre of gravity is met. */
const CLOSE = 3e-4

/** Radius of the rounding of the two outer corners, and the angle from a side to the middle of its rounding. */
function rounding(halfAngle: number, inner: number, outer: number) {
  const narrow = outer * Math.sin(Math.min(halfAngle, Math.PI / 2))
  const round = Math.min(CORNER_ROUND * (outer - inner), 0.4 * narrow)
  return { round, away: Math.asin(round / (outer - round)) }
}

/** How far out a side is straight. */
export function sideLength({ halfAngle, inner, outer }: CounterweightSector): number {
  const { round, away } = rounding(halfAngle, inner, outer)
  return (outer - round) * Math.cos(away)
}

/** The sector's outline symmetrical about +y, its two outer corners rounded; it begins with the inner arc. */
export function sectorOutline(halfAngle: number, inner: number, outer: number): Outline {
  const up = Math.PI / 2
  const { round, away } = rounding(halfAngle, inner, outer)
  const right = up - halfAngle + away
  const left = up + halfAngle - away
  const corner = (at: number, from: number, to: number) =>
    arc((outer - round) * Math.cos(at), (outer - round) * Math.sin(at), round, from, to)
  return [
    ...arc(0, 0, inner, up + halfAngle, up - halfAngle),
    ...corner(right, right - away - up, right).slice(0, -2),
    ...arc(0, 0, outer, right, left),
    ...corner(left, left, left + away + up).slice(2),
  ]
}

/** What a counterweight must weigh, where its centre of gravity must lie, and the room it has, in SI. */
export interface CounterweightDemand {
  mass: number
  radius: number
  thickness: number
  /** Least inner radius: the boss of the journal. */
  inner: number
  /** Largest radius that turns freely, or that its disc allows. */
  largest: number
}

/**
 * The sector of steel of this thickness whose mass and centre of gravity match. The inner radius is the boss of the
 * journal; the half angle follows from the mass, the outer radius from the centre of gravity, up to the largest
 * radius that turns freely. The area of a sector is γ·(R² − a²) and its centre of gravity lies at
 * 2·sin γ·(R³ − a³) / (3·γ·(R² − a²)) (elementary); the rounded corners are allowed for by taking both from the outline.
 */
export function counterweightSector(demand: CounterweightDemand): CounterweightSector {
  const { mass, radius, thickness, inner, largest } = demand
  const wanted = mass / (STEEL * thickness)
  const least = Math.min(Math.max(1.04 * inner, Math.sqrt(inner * inner + wanted / WIDEST)), largest)
  const near = fit(wanted, inner, least)
  if (near.radius >= radius) return judged(near, demand)
  return judged(
    solve((outer) => fit(wanted, inner, outer), least, largest, radius),
    demand,
  )
}

/**
 * The same as a segment of a disc's rim: the outer radius is the largest, the inner one follows from the centre of gravity.
 * Drawn in, the segment first moves outwards and then, growing wide, back: what lies beyond the farthest is not looked at.
 */
export function rimSector(demand: CounterweightDemand): CounterweightSector {
  const { mass, radius, thickness, inner, largest } = demand
  const wanted = mass / (STEEL * thickness)
  const at = (bore: number) => fit(wanted, bore, largest)
  if (largest <= inner || at(inner).radius >= radius) return counterweightSector(demand)
  const most = Math.sqrt(Math.max(largest * largest - wanted / WIDEST, inner * inner))
  const steps = 24
  const farthest = Array.from({ length: steps + 1 }, (_, i) =>
    at(inner + ((most - inner) * i) / steps),
  ).reduce((best, next) => (next.radius > best.radius ? next : best))
  return judged(farthest.radius <= radius ? farthest : solve(at, inner, farthest.inner, radius), demand)
}

interface Fitted {
  halfAngle: number
  inner: number
  outer: number
  area: number
  radius: number
}

/** Between two sizes, the one that puts the centre of gravity at the radius; the larger where neither reaches it. */
function solve(at: (size: number) => Fitted, from: number, to: number, radius: number): Fitted {
  let low = from
  let high = to
  let best = at(high)
  if (best.radius <= radius) return best
  for (let i = 0; i < 24 && Math.abs(best.radius - radius) > CLOSE * radius; i++) {
    const middle = (low + high) / 2
    best = at(middle)
    if (best.radius < radius) low = middle
    else high = middle
  }
  return best
}

function judged(
  { area, ...sector }: Fitted,
  { mass, radius, thickness }: CounterweightDemand,
): CounterweightSector {
  const drawn = area * STEEL * thickness
  const capped = Math.abs(drawn - mass) > 0.005 * mass || Math.abs(sector.radius - radius) > 0.005 * radius
  return { ...sector, mass: drawn, capped }
}

/** The half angle that gives the area at this outer radius: γ from the formula, with what the round corners take off. */
function fit(area: number, inner: number, outer: number): Fitted {
  const ring = outer * outer - inner * inner
  let halfAngle = LEAST
  let moments = { area: 0, x: 0, y: 0 }
  let lost = 0
  for (let i = 0; i < 4; i++) {
    halfAngle = Math.min(Math.max((area + lost) / ring, LEAST), WIDEST)
    moments = areaMoments(sectorOutline(halfAngle, inner, outer))
    lost = halfAngle * ring - moments.area
  }
  return { halfAngle, inner, outer, area: moments.area, radius: moments.y / moments.area }
}
