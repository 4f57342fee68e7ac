import { leastOverPeriod } from '@/lib/numerics/least-over-period'
import { deadCentres } from '../dead-centres'
import { pistonHeight } from '../link-rod'
import { rodPaths } from '../rod-path'
import type { Train } from '../train'
import { bankToBank } from './bank-gap'
import { clearancePairs, type Pair } from './pairs'
import { rodBesideRod } from './rod-beside-rod'
import { rodInBore } from './rod-in-bore'
import type { ClearanceModel, ClearanceSizes } from './sizes'
import { skirtToCounterweight, skirtToWeb } from './skirt-gap'

/** The least gap of one pair over a turn of the crank, m, and the crank angle where it is, rad; null where nothing moves. */
export interface LeastGap {
  gap: number
  angle: number | null
}

/** `clear` keeps its limit, `close` is free and under it, `touches` is under 0. */
export type ClearanceStatus = 'clear' | 'close' | 'touches'

export interface Clearance extends LeastGap {
  pair: Pair
  /** What the gap should be at least, m. */
  limit: number
  status: ClearanceStatus
}

/** Common practice, cold, m: running parts 1.5 mm, a wall between bores 4 mm, a crown no higher than the deck. */
export const clearanceLimit = (kind: Pair['kind']): number =>
  kind === 'piston-deck' ? 0 : kind === 'bore-wall' ? 0.004 : 0.0015

const TURN = 2 * Math.PI

export function clearanceModel(train: Train, sizes: ClearanceSizes): ClearanceModel {
  const paths = rodPaths(train)
  return {
    train,
    paths,
    centres: deadCentres(paths),
    sizes,
  }
}

/** The gap of a pair as a function of the crank angle, rad → m. It repeats every turn, on a four-stroke too. */
export function gapOf(model: ClearanceModel, pair: Pair): (theta: number) => number {
  switch (pair.kind) {
    case 'skirt-counterweight':
      return skirtToCounterweight(model, pair.cylinder, pair.counterweight)
    case 'skirt-web':
      return skirtToWeb(model, pair.cylinder, pair.web)
    case 'bank-bank':
      return bankToBank(model, pair.cylinder, pair.other)
    case 'rod-bore':
      return rodInBore(model, pair.cylinder)
    case 'rod-rod':
      return rodBesideRod(model, pair.cylinder, pair.other)
    case 'piston-deck':
      return deckGap(model, pair.cylinder)
    case 'bore-wall':
      return () => boreWall(model, pair.cylinder, pair.other)
  }
}

/** Deck height − (s + crown above the pin). */
function deckGap({ sizes, paths }: ClearanceModel, cylinder: number) {
  const room = sizes.deck! - sizes.pistons[cylinder]!.crown
  return (theta: number) => room - pistonHeight(paths, cylinder, theta)
}

/** Distance of two bores' axes less both radii. */
function boreWall({ train }: ClearanceModel, one: number, other: number): number {
  const [a, b] = [train.cylinders[one], train.cylinders[other]]
  return Math.abs(a.axial - b.axial) - (a.bore + b.bore) / 2
}

/**
 * The least gap of a pair: where it follows the piston alone at its exact dead centre, else by a sweep over a turn, there
 * exact to double rounding with its angle to about 1e-8 rad.
 */
export function leastGap(model: ClearanceModel, pair: Pair): LeastGap {
  const gap = gapOf(model, pair)
  if (pair.kind === 'bore-wall') return { gap: gap(0), angle: null }
  if (pair.kind === 'skirt-counterweight' || pair.kind === 'piston-deck') {
    const { bottom, top } = model.centres[pair.cylinder]
    const angle = pair.kind === 'piston-deck' ? top : bottom
    return { gap: gap(angle), angle }
  }
  const { at, value } = leastOverPeriod(gap, TURN, STEPS)
  return { gap: value, angle: at }
}

/** Rods and pistons have no two dips within 3° of each other. */
const STEPS = 120

/** Every pair that can meet with its least gap, its limit and how it stands; the tightest against its limit first. */
export function clearances(train: Train, sizes: ClearanceSizes): Clearance[] {
  const model = clearanceModel(train, sizes)
  return clearancePairs(model)
    .map((pair): Clearance => {
      const least = leastGap(model, pair)
      const limit = clearanceLimit(pair.kind)
      return { pair, ...least, limit, status: statusOf(least.gap, limit) }
    })
    .sort((a, b) => a.gap - a.limit - (b.gap - b.limit))
}

/** Rounding takes nothing from a gap that is just its limit. */
const ROUNDING = 1e-9

export const statusOf = (gap: number, limit: number): ClearanceStatus =>
  gap >= limit - ROUNDING ? 'clear' : gap >= -ROUNDING ? 'close' : 'touches'
