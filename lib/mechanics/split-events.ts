/** What a search over splits asks and hands over. Spreads are in the unit of the intervals. */
export interface SplitJudge {
  /** Whether a split whose groups cannot have less than these spreads is still wanted. */
  admits(worst: number, total: number): boolean
  /** A whole split: places of events, rising, by group. */
  take(groups: number[][]): void
}

interface Group {
  room: number
  mean: number
  places: number[]
  least: number
  most: number
}

const MOST_STEPS = 2_000_000

/**
 * Every split of the events of one cycle into `count` groups, whose sizes differ by one at most, that the judge admits.
 * Events are dealt one after the other; a group's spread is at least what its intervals so far and their mean (the cycle
 * shared by its size) span, and the interval still open is at least as long as the time that has gone by: whatever cannot
 * be admitted any more is dropped. The first split tried is the dealing in turn. Groups of one size that hold nothing yet are
 * alike, so only the first of them is tried. Stops after two million steps; `complete` is false then.
 */
export function splitEvents(
  intervals: readonly number[],
  count: number,
  judge: SplitJudge,
): { complete: boolean } {
  const events = intervals.length
  const at: number[] = [0]
  for (const interval of intervals) at.push(at[at.length - 1] + interval)
  const cycle = at[events]
  const groups = Array.from({ length: count }, (_, index): Group => {
    const room = Math.floor(events / count) + (index < events % count ? 1 : 0)
    return { room, mean: cycle / room, places: [], least: cycle / room, most: cycle / room }
  })
  let steps = 0

  const admitted = (next: number) => {
    let worst = 0
    let total = 0
    for (const { places, room, least, most } of groups) {
      const open = places.length > 0 && places.length < room ? at[next] - at[places[places.length - 1]] : 0
      const spread = Math.max(most, open) - least
      worst = Math.max(worst, spread)
      total += spread
    }
    return judge.admits(worst, total)
  }
  const deal = (event: number) => {
    if (++steps > MOST_STEPS) return
    if (!admitted(event)) return
    if (event === events) return judge.take(groups.map(({ places }) => [...places]))
    for (const group of candidates(groups)) {
      const { least, most, places } = group
      if (places.length > 0) stretch(group, at[event] - at[places[places.length - 1]])
      places.push(event)
      if (places.length === group.room) stretch(group, cycle - at[event] + at[places[0]])
      deal(event + 1)
      places.pop()
      group.least = least
      group.most = most
    }
  }
  deal(0)
  return { complete: steps <= MOST_STEPS }
}

function stretch(group: Group, interval: number) {
  group.least = Math.min(group.least, interval)
  group.most = Math.max(group.most, interval)
}

/** Groups with room, the one that has waited longest first; of empty ones of a size only one. */
function candidates(groups: readonly Group[]): Group[] {
  const empty = new Set<number>()
  return groups
    .filter(({ places, room }) => {
      if (places.length === room) return false
      if (places.length > 0) return true
      if (empty.has(room)) return false
      empty.add(room)
      return true
    })
    .sort((one, other) => (one.places.at(-1) ?? -1) - (other.places.at(-1) ?? -1))
}
