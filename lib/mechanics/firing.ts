import { wrap } from '@/lib/numerics/wrap'
import { deadCentres, type DeadCentres } from './dead-centres'
import { firingChoice, SAME, type FiringChoice } from './firing-choice'
import { rodPaths } from './rod-path'
import type { Train } from './train'

export interface FiringEvent {
  cylinder: number // index
  angle: number // rad, 0 ≤ x < cycle
}

/** Intervals from the first event in the firing order on, closing the cycle, rad. */
export interface FiringIntervals {
  intervals: number[]
  even: boolean
}

export interface Firing extends FiringIntervals {
  events: FiringEvent[]
  /** One entry a bank and a collector of the train. */
  banks: FiringIntervals[]
  collectors: FiringIntervals[]
  /** No two successive events on one bank, all the way round. */
  alternatesBanks: boolean
}

/** Intervals that differ from their mean by no more are even. */
export const EVEN_WITHIN = (0.5 * Math.PI) / 180

/** The choice of turns for a train, or where its firing order breaks (see firing-choice). */
export function chooseFiring(train: Train, centres: readonly DeadCentres[]): FiringChoice {
  return firingChoice({
    tops: centres.map(({ top }) => top),
    order: train.firingOrder,
    cycle: train.cycle,
    stated: train.cylinders.map(({ firesAt }) => firesAt),
  })
}

/** Firing angle of each cylinder, rad. Throws RangeError for an order that no choice of turns satisfies. */
export function firingAngles(train: Train, centres = deadCentres(rodPaths(train))): number[] {
  const choice = chooseFiring(train, centres)
  if (choice.ok) return choice.angles
  const { id } = train.cylinders[choice.breaksAt]
  throw new RangeError(`The firing order cannot be: it breaks at cylinder ${id}.`)
}

/** Firing events of one cycle in the firing order: angles rise from the first on, and pass the cycle's end once at most. */
export const firingEvents = (train: Train, angles: readonly number[] = firingAngles(train)): FiringEvent[] =>
  train.firingOrder.map((cylinder) => ({ cylinder, angle: angles[cylinder] }))

/** Events with their intervals by engine, bank and collector. */
export function firingOf(train: Train, events: FiringEvent[] = firingEvents(train)): Firing {
  const { cycle, cylinders } = train
  const among = (member: (cylinder: number) => boolean) =>
    firingIntervals(
      events.filter(({ cylinder }) => member(cylinder)).map(({ angle }) => angle),
      cycle,
    )
  const bankOf = (event: FiringEvent) => cylinders[event.cylinder].bank
  return {
    events,
    ...among(() => true),
    banks: train.banks.map((_, bank) => among((cylinder) => cylinders[cylinder].bank === bank)),
    collectors: train.collectors.map((collector) =>
      among((cylinder) => collector.cylinders.includes(cylinder)),
    ),
    alternatesBanks: events.every(
      (event, index) => bankOf(event) !== bankOf(events[(index + 1) % events.length]),
    ),
  }
}

/** Intervals between firing angles that follow each other round the cycle, the last one closing it. */
export function firingIntervals(angles: readonly number[], cycle: number): FiringIntervals {
  const intervals = angles.slice(1).map((angle, index) => step(angles[index], angle, cycle))
  if (angles.length > 0) intervals.push(cycle - intervals.reduce((sum, interval) => sum + interval, 0))
  const mean = cycle / angles.length
  return { intervals, even: intervals.every((interval) => Math.abs(interval - mean) <= EVEN_WITHIN) }
}

/** From one firing to the next; two at one angle may be out of order by less than they are told apart. */
function step(from: number, to: number, cycle: number): number {
  const angle = wrap(to - from, cycle)
  return angle > cycle - SAME ? angle - cycle : angle
}
