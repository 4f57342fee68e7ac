import type { Complex } from '@/lib/numerics/fourier'
import { linearSolve } from '@/lib/numerics/linear-solve'
import { leastSquares, type Lever } from './least-squares'
import { along, minus, nothing, phasor, plus, scaled } from './phasor'

/** Where a weight may sit, and the most it may weigh, kg. */
export interface MassPlane extends Lever {
  most?: number
}

export interface LeastMass {
  /** Mass of each weight with its direction, kg. */
  masses: Complex[]
  /** No choice of weights that balances is lighter than this, kg: the value of the dual problem. */
  bound: number
  /** False where no choice balances: the weights then come as near as they can. */
  balances: boolean
}

/** Steps of the quadratic term: from a spread over all planes to the least mass. */
const SOFT = 16
const HARD = 1e-3
const SOFTER = 4
const PROXIMAL_STEPS = 30
/** Of the demand, in its own units; a multiplier's rounding counts 1/ε times. */
const EXACT = 4e-15
const MET = 1e-9
const NEWTON_STEPS = 1000
/** Of a value of about 1. */
const UNRESOLVED = 1e-13
const LEAST_DAMPING = 1e-14
const MOST_DAMPING = 1e10
/** Lighter than this share of the whole is no weight. */
const CARRIES = 1e-11

/**
 * The lightest weights m_i (complex: mass and direction) that answer a force and a couple: minimise Σ|m_i| where
 * Σ r_i·m_i = force and Σ z_i·r_i·m_i = couple, |m_i| ≤ most_i. Among equally light ones, the least Σ|m_i|².
 * Force kg m, couple kg m² about z = 0; radii above 0, at least one plane.
 *
 * A second-order-cone problem. Its dual, max Re⟨λ,b⟩ where |r_i·(λ₀ + λ₁·z_i)| ≤ 1, has four real unknowns. With
 * ε/2·Σ|m_i − a_i|² added, the dual is smooth and each m_i is a soft threshold of its multiplier; Newton's method with
 * a line search solves it (semismooth Newton: Qi and Sun, Math. Programming 58, 1993). ε falls step by step from a
 * spread over all planes, which also settles ties; then a_i becomes the last answer (proximal point: Rockafellar, SIAM
 * J. Control 14, 1976), which converges to the exact one. `bound` certifies it.
 */
export function leastMass(planes: readonly MassPlane[], force: Complex, couple: Complex): LeastMass {
  const problem = scaledProblem(planes, force, couple)
  const { size, lever } = problem
  if (size === 0) return { masses: planes.map(() => nothing), bound: 0, balances: true }
  let masses = planes.map(() => nothing)
  let dual = startingDual(problem)
  for (let soft = SOFT; soft > HARD; soft /= SOFTER) dual = newton(problem, masses, soft, dual).dual
  let balances = false
  for (let step = 0; step < PROXIMAL_STEPS; step++) {
    const last = masses
    const found = newton(problem, last, HARD, dual)
    ;({ dual, masses } = found)
    balances = found.gap < MET
    const moved = masses.reduce((most, mass, i) => Math.max(most, phasor(minus(mass, last[i])).size), 0)
    if (!balances || moved < EXACT / HARD) break
  }
  if (balances) masses = polished(problem, masses)
  return {
    masses: masses.map((mass) => scaled(mass, size / lever)),
    bound: (bound(problem, dual) * size) / lever,
    balances,
  }
}

type Dual = [Complex, Complex]

/** Masses in units of size/lever, places −1…1: everything is about 1. */
interface Problem {
  size: number
  lever: number
  arms: Required<MassPlane>[]
  force: Complex
  couple: Complex
}

function scaledProblem(planes: readonly MassPlane[], force: Complex, couple: Complex): Problem {
  const places = planes.map(({ place }) => place)
  const [low, high] = [Math.min(...places), Math.max(...places)]
  const middle = (low + high) / 2
  const half = (high - low) / 2 || 1
  const lever = Math.max(...planes.map(({ radius }) => radius))
  const about = scaled(minus(couple, scaled(force, middle)), 1 / half)
  const size = phasor(force).size + phasor(about).size
  const unit = size || 1
  return {
    size,
    lever,
    arms: planes.map(({ place, radius, most = Infinity }) => ({
      radius: radius / lever,
      place: (place - middle) / half,
      most: (most * lever) / unit,
    })),
    force: scaled(force, 1 / unit),
    couple: scaled(about, 1 / unit),
  }
}

/** λ of the least squares spread: where the quadratic term alone would decide. */
function startingDual({ arms, force, couple }: Problem): Dual {
  return leastSquares(arms, force, couple).map((part) => scaled(part, SOFT)) as Dual
}

const multiplier = ({ radius, place }: Lever, [at, slope]: Dual): Complex =>
  scaled(plus(at, scaled(slope, place)), radius)

/** What the masses leave of the demand: the gradient of the dual. */
function left({ arms, force, couple }: Problem, masses: readonly Complex[]): Dual {
  return arms.reduce<Dual>(
    ([f, c], { radius, place }, i) => [
      minus(f, scaled(masses[i], radius)),
      minus(c, scaled(masses[i], radius * place)),
    ],
    [force, couple],
  )
}

const gapOf = ([f, c]: Dual) => Math.hypot(f.re, f.im, c.re, c.im)

interface Point {
  dual: Dual
  masses: Complex[]
  value: number
  gap: number
}

/** The masses that a multiplier calls for: |m| + soft/2·|m − anchor|² is least, and the value of the dual there. */
function pointAt(problem: Problem, anchor: readonly Complex[], soft: number, dual: Dual): Point {
  const { arms, force, couple } = problem
  let value = along(dual[0], force) + along(dual[1], couple)
  const masses = arms.map((arm, i) => {
    const pull = multiplier(arm, dual)
    const wish = plus(anchor[i], scaled(pull, 1 / soft))
    const { size } = phasor(wish)
    const mass = Math.min(Math.max(size - 1 / soft, 0), arm.most)
    const chosen = mass > 0 ? scaled(wish, mass / size) : nothing
    const off = phasor(minus(chosen, anchor[i])).size
    value -= along(pull, chosen) - mass - (soft / 2) * off * off
    return chosen
  })
  return { dual, masses, value, gap: gapOf(left(problem, masses)) }
}

/**
 * Newton's method up the dual. A step that gains too little is damped and tried again (Levenberg, Quart. Appl. Math. 2,
 * 1944); near the end the value no longer resolves a gain, and the gap alone tells.
 */
function newton(problem: Problem, anchor: readonly Complex[], soft: number, start: Dual): Point {
  let at = pointAt(problem, anchor, soft, start)
  let curved = curvature(problem, anchor, soft, at)
  let damping = LEAST_DAMPING
  for (let step = 0; step < NEWTON_STEPS && at.gap > EXACT / soft && damping < MOST_DAMPING; step++) {
    const [f, c] = left(problem, at.masses)
    const gradient = [f.re, f.im, c.re, c.im]
    const damped = curved.map((row, k) => row.map((value, l) => (k === l ? value + damping / soft : value)))
    const way = linearSolve(damped, gradient)
    const gain = gradient.reduce((sum, part, k) => sum + part * way[k], 0)
    const next = pointAt(problem, anchor, soft, [
      plus(at.dual[0], { re: way[0], im: way[1] }),
      plus(at.dual[1], { re: way[2], im: way[3] }),
    ])
    const same = next.value >= at.value - UNRESOLVED * (1 + Math.abs(at.value))
    if (next.value >= at.value + 1e-4 * gain || (same && next.gap <= at.gap / 2)) {
      at = next
      curved = curvature(problem, anchor, soft, at)
      damping = Math.max(LEAST_DAMPING, damping / 100)
    } else damping *= 10
  }
  return at
}

/** How the masses answer a change of the dual: 4 by 4, singular where too few planes carry. */
function curvature({ arms }: Problem, anchor: readonly Complex[], soft: number, { dual }: Point): number[][] {
  const h = [0, 1, 2, 3].map(() => [0, 0, 0, 0])
  arms.forEach((arm, i) => {
    const wish = plus(anchor[i], scaled(multiplier(arm, dual), 1 / soft))
    const { size } = phasor(wish)
    const free = size - 1 / soft
    if (free <= 0) return
    const [u, v] = [wish.re / size, wish.im / size]
    const capped = free > arm.most
    const across = (capped ? arm.most : free) / size / soft
    const lengthwise = capped ? 0 : 1 / soft
    const d = [
      [across * v * v + lengthwise * u * u, (lengthwise - across) * u * v],
      [(lengthwise - across) * u * v, across * u * u + lengthwise * v * v],
    ]
    for (let row = 0; row < 4; row++)
      for (let column = 0; column < 4; column++)
        h[row][column] += arm.radius ** 2 * arm.place ** ((row >> 1) + (column >> 1)) * d[row & 1][column & 1]
  })
  return h
}

/** What is left by rounding, spread over the planes that carry and are not full. */
function polished(problem: Problem, masses: Complex[]): Complex[] {
  const carries = masses.map((mass, i) => {
    const { size } = phasor(mass)
    return size > CARRIES && size < problem.arms[i].most
  })
  const clean = masses.map((mass) => (phasor(mass).size > CARRIES ? mass : nothing))
  const arms = problem.arms.filter((_, i) => carries[i])
  if (arms.length === 0) return clean
  return [0, 1].reduce((now) => {
    const correction = leastSquares(arms, ...left(problem, now))
    return now.map((mass, i) => (carries[i] ? plus(mass, multiplier(problem.arms[i], correction)) : mass))
  }, clean)
}

/** The dual's value, after drawing it in to where every multiplier of a plane without a limit is at most 1. */
function bound({ arms, force, couple }: Problem, dual: Dual): number {
  const pulls = arms.map((arm) => phasor(multiplier(arm, dual)).size)
  const over = Math.max(1, ...pulls.filter((_, i) => arms[i].most === Infinity))
  const limited = arms.reduce(
    (sum, { most }, i) => (most === Infinity ? sum : sum + most * Math.max(0, pulls[i] / over - 1)),
    0,
  )
  return (along(dual[0], force) + along(dual[1], couple)) / over - limited
}
