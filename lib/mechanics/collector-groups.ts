import { bestOf } from './best-of'
import { exhaustPulses, usualWindow, type CollectorPulses, type PulseWindow } from './exhaust-pulses'
import { firingEvents, firingIntervals, type FiringEvent } from './firing'
import { compareKeys, intervalSpread, rankKey } from './interval-spread'
import { splitEvents } from './split-events'
import type { Train } from './train'

/** One way to lead the cylinders into collectors; rad. */
export interface CollectorGrouping {
  groups: { cylinders: number[]; intervals: number[]; spread: number }[]
  pulses: CollectorPulses[]
  /** Of the worst group. */
  worstSpread: number
  /** Of all groups together. */
  totalSpread: number
  /** Of all pulses together. */
  overlap: number
  /** How many pipes lead to a collector that another bank leads to as well: banks a group takes from, less one, over all groups. */
  crossings: number
}

export interface CollectorGroupings {
  /** Best first. */
  groupings: CollectorGrouping[]
  /** False when the search stopped at its limit. */
  complete: boolean
}

/**
 * The best groupings of the cylinders into `count` collectors that differ in size by one at most, for the firing
 * that the train has: least spread of intervals (greatest less least) in the worst group, then over all groups, then least
 * overlap of blow-down windows, then fewest banks crossed, then by the cylinders' own sequence.
 * 1 ≤ count ≤ cylinders; RangeError otherwise.
 */
export function bestCollectorGroups(
  train: Train,
  count: number,
  { keep = 6, window = usualWindow(train) }: { keep?: number; window?: PulseWindow } = {},
): CollectorGroupings {
  const events = firingEvents(train)
  if (!Number.isInteger(count) || count < 1 || count > events.length)
    throw new RangeError(`${count} collectors for ${events.length} cylinders.`)
  const { intervals } = firingIntervals(
    events.map(({ angle }) => angle),
    train.cycle,
  )
  const best = bestOf<CollectorGrouping>(keep)
  const { complete } = splitEvents(intervals, count, {
    admits: (worst, total) => best.admits([rankKey(worst), rankKey(total)]),
    take(groups) {
      const grouping = groupingOf(train, events, groups, window)
      best.add(
        [
          rankKey(grouping.worstSpread),
          rankKey(grouping.totalSpread),
          rankKey(grouping.overlap),
          grouping.crossings,
          ...grouping.groups.flatMap(({ cylinders }) => cylinders),
        ],
        grouping,
      )
    },
  })
  return { groupings: best.kept.map(({ value }) => value), complete }
}

/** A grouping with its figures: `places` of events, by group. */
function groupingOf(
  train: Train,
  events: readonly FiringEvent[],
  places: readonly (readonly number[])[],
  window: PulseWindow,
): CollectorGrouping {
  const groups = places
    .map((group) => {
      const { intervals } = firingIntervals(
        group.map((place) => events[place].angle),
        train.cycle,
      )
      const cylinders = group.map((place) => events[place].cylinder)
      return { cylinders, intervals, spread: intervalSpread(intervals).spread }
    })
    .sort((one, other) => compareKeys([Math.min(...one.cylinders)], [Math.min(...other.cylinders)]))
  const pulses = exhaustPulses(
    train,
    window,
    groups.map(({ cylinders }) => cylinders),
    events,
  )
  const banksOf = (cylinders: readonly number[]) =>
    new Set(cylinders.map((one) => train.cylinders[one].bank)).size
  return {
    groups,
    pulses,
    worstSpread: Math.max(...groups.map(({ spread }) => spread)),
    totalSpread: groups.reduce((sum, { spread }) => sum + spread, 0),
    overlap: pulses.reduce((sum, own) => own.pulses.reduce((all, { overlap }) => all + overlap, sum), 0),
    crossings: groups.reduce((sum, { cylinders }) => sum + banksOf(cylinders) - 1, 0),
  }
}
