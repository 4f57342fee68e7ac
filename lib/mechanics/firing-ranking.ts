import { deadCentres } from './dead-centres'
import { bestOf } from './best-of'
import { firingIntervals, firingOf, type FiringEvent } from './firing'
import { firingChoice } from './firing-choice'
import { legalFiringOrders } from './firing-orders'
import { intervalSpread, rankKey, type IntervalSpread } from './interval-spread'
import { rodPaths } from './rod-path'
import { succession, type Succession } from './succession'
import type { Train } from './train'

/** A firing order with what it is judged by; angles in rad. */
export interface RankedOrder extends IntervalSpread, Succession {
  /** Indices of cylinders, beginning with the first. */
  order: number[]
  intervals: number[]
  /** The worst spread of intervals within one of the train's collectors; 0 without collectors. */
  collectorSpread: number
}

export interface RankedOrders {
  /** Best first. */
  orders: RankedOrder[]
  /** How many legal orders were seen; more than `orders` holds when the list was cut. */
  found: number
  /** False when the search stopped at its limit with orders left unseen. */
  complete: boolean
}

export interface RankingQuestion {
  even: boolean
  /** The most that are kept. */
  keep?: number
}

/** All orders of a four-stroke are 2^(cylinders − 1) choices: beyond this many cylinders only the even ones are sought. */
export const MOST_CYLINDERS = 16
const MOST_SEEN = 2 ** 15
const STRIDE = 256

/**
 * Every legal order of a train (see firing-orders), ranked by evenness (greatest less least interval, then its rms), then by
 * firings in succession on one bank, on one throw, on neighbouring throws, then by the worst spacing within a collector,
 * then by the names' own sequence. Where an order leaves a choice of turns, it is judged by the choice that an analysis
 * takes; angles that cylinders state are left out of account. Yields how many orders were seen, now and then, so that
 * a search can show how far it is.
 */
export function* rankFiringOrders(
  train: Train,
  { even, keep = 4096 }: RankingQuestion,
): Generator<number, RankedOrders> {
  const best = bestOf<RankedOrder>(keep)
  const tops = topsOf(train)
  let found = 0
  for (const order of legalFiringOrders(train, { even })) {
    if (found === MOST_SEEN) return { orders: best.kept.map(({ value }) => value), found, complete: false }
    found++
    const firing = intervalsOf(train, order, tops)
    if (best.admits([rankKey(firing.spread), rankKey(firing.rms)])) {
      const ranked = judged(train, order, firing)
      best.add(keysOf(ranked), ranked)
    }
    if (found % STRIDE === 0) yield found
  }
  return { orders: best.kept.map(({ value }) => value), found, complete: true }
}

/** One order of the train with what it is judged by. Throws RangeError for an order that cannot be. */
export const rankOrder = (train: Train, order: readonly number[], stated: Stated = []): RankedOrder =>
  judged(train, order, intervalsOf(train, order, topsOf(train), stated))

type Stated = readonly (number | undefined)[]

interface Timed extends IntervalSpread {
  events: FiringEvent[]
  intervals: number[]
}

const topsOf = (train: Train) => deadCentres(rodPaths(train)).map(({ top }) => top)

function intervalsOf(train: Train, order: readonly number[], tops: number[], stated: Stated = []): Timed {
  const choice = firingChoice({ tops, order, cycle: train.cycle, stated })
  if (!choice.ok)
    throw new RangeError(`The firing order breaks at cylinder ${train.cylinders[choice.breaksAt].id}.`)
  const events = order.map((cylinder) => ({ cylinder, angle: choice.angles[cylinder] }))
  const angles = events.map(({ angle }) => angle)
  const { intervals } = firingIntervals(angles, train.cycle)
  return { events, intervals, ...intervalSpread(intervals) }
}

function judged(train: Train, order: readonly number[], { events, ...timed }: Timed): RankedOrder {
  const spreads = firingOf(train, events).collectors.map((own) => intervalSpread(own.intervals).spread)
  return {
    order: [...order],
    ...timed,
    ...succession(train, order),
    collectorSpread: Math.max(0, ...spreads),
  }
}

const keysOf = (ranked: RankedOrder) => [
  rankKey(ranked.spread),
  rankKey(ranked.rms),
  ranked.sameBank,
  ranked.sameThrow,
  ranked.adjacentThrow,
  rankKey(ranked.collectorSpread),
  ...ranked.order,
]

/** The ranking all at once. */
export function rankedFiringOrders(train: Train, question: RankingQuestion): RankedOrders {
  const search = rankFiringOrders(train, question)
  for (;;) {
    const step = search.next()
    if (step.done) return step.value
  }
}
