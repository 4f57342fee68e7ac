import { firingEvents, firingIntervals, type FiringEvent } from './firing'
import { SAME } from './firing-choice'
import { intervalSpread } from './interval-spread'
import type { Train } from './train'
import { wrap } from '@/lib/numerics/wrap'

const DEGREE = Math.PI / 180

/** The blow-down of one cylinder: from exhaust opening, `opens` after its firing top dead centre, for `length`; rad. */
export interface PulseWindow {
  opens: number
  length: number
}

/** One exhaust pulse as its collector feels it; rad. */
export interface Pulse {
  cylinder: number
  /** Crank angle at which its exhaust opens, 0 ≤ x < cycle. */
  opens: number
  /** Since the last pulse in the collector opened: the whole cycle where it has the collector to itself, 0 where two open at once. */
  gap: number
  /** How much of its window another pulse of the collector is in its own. */
  overlap: number
}

export interface CollectorPulses {
  /** Index of the train's collector; null for the pipe of a cylinder that is in none. */
  collector: number | null
  /** In firing order. */
  pulses: Pulse[]
  /** Greatest less least gap. */
  gapSpread: number
  /** Greatest less least overlap. */
  overlapSpread: number
  /** Place in `pulses` of the worst placed cylinder: the most overlap, then the least gap. It sets what the others may be tuned to. */
  worst: number
}

/**
 * The window of the document: opening as its heat-release model has it, for three of that model's blow-down constants, after
 * which e^−3 = 5 % of the pressure is left. Without that model 135° and 45° on a four-stroke, 110° and 45° on a
 * two-stroke (common practice).
 */
export function usualWindow({ gas, cycle }: Train): PulseWindow {
  if (gas.model === 'heat-release') return { opens: gas.exhaustOpens, length: 3 * gas.blowdown }
  return { opens: (cycle > 2 * Math.PI ? 135 : 110) * DEGREE, length: 45 * DEGREE }
}

/**
 * Exhaust pulses by collector. In its window of length L a pulse is met by the last pulse for L − gap, by the next for
 * L − (gap to the next), neither less than 0, together L at most. Window length above 0 and up to the cycle.
 */
export function exhaustPulses(
  train: Train,
  { opens, length }: PulseWindow,
  collectors: readonly (readonly number[])[] = train.collectors.map(({ cylinders }) => cylinders),
  events: readonly FiringEvent[] = firingEvents(train),
): CollectorPulses[] {
  const piped = new Set(collectors.flat())
  const alone = events.filter(({ cylinder }) => !piped.has(cylinder)).map(({ cylinder }) => [cylinder])
  return [...collectors, ...alone].map((members, index) => {
    const own = events.filter(({ cylinder }) => members.includes(cylinder))
    const steps = firingIntervals(
      own.map(({ angle }) => angle),
      train.cycle,
    ).intervals
    const pulses = own.map(({ cylinder, angle }, place): Pulse => {
      const [last, next] = [steps[(place + steps.length - 1) % steps.length], steps[place]]
      const overlap = Math.min(length, Math.max(0, length - last) + Math.max(0, length - next))
      const single = own.length === 1
      return {
        cylinder,
        opens: wrap(angle + opens, train.cycle),
        gap: !single && next <= SAME ? 0 : last,
        overlap: single ? 0 : overlap,
      }
    })
    return {
      collector: index < collectors.length ? index : null,
      pulses,
      gapSpread: intervalSpread(pulses.map(({ gap }) => gap)).spread,
      overlapSpread: intervalSpread(pulses.map(({ overlap: met }) => met)).spread,
      worst: worstPlaced(pulses),
    }
  })
}

function worstPlaced(pulses: readonly Pulse[]): number {
  let worst = 0
  pulses.forEach((pulse, place) => {
    const most = pulses[worst]
    const more = pulse.overlap - most.overlap
    if (more > SAME || (more > -SAME && pulse.gap < most.gap - SAME)) worst = place
  })
  return worst
}
