import { wrap, wrapCentred } from '@/lib/numerics/wrap'

export interface FiringQuestion {
  /** Crank angle of each cylinder's top dead centre in one turn, rad. */
  tops: readonly number[]
  /** Cylinder indices, each once. */
  order: readonly number[]
  /** 2π or 4π. */
  cycle: number
  /** Stated firing angles, rad, by cylinder. */
  stated: readonly (number | undefined)[]
}

/** Firing angle of each cylinder, 0 ≤ x < cycle; or the first cylinder that no choice of turns brings in its place. */
export type FiringChoice = { ok: true; angles: number[] } | { ok: false; breaksAt: number }

const TURN = 2 * Math.PI
/** Angles of a train are compared within 0.01°: nearer than this, two top dead centres are one. */
export const SAME = (0.01 * Math.PI) / 180
/** A stated firing angle means the top dead centre within half a degree of it. */
export const STATED_WITHIN = (0.5 * Math.PI) / 180
/** Sums of squared intervals nearer than this, rad², are a tie. */
const TIE = 1e-6

/**
 * Which of its top dead centres each cylinder fires at: of the choices that keep the firing order, the one with the
 * least sum of squared intervals; on a tie the one whose first event in the firing order, then second, … is earliest
 * in the cycle.
 *
 * The order fixes the least step from each cylinder to the next, so a choice is only where in the cycle the whole turns
 * left over (at most two) are spent: every one of them is tried, a few thousand at 64 cylinders.
 * Cylinders of one top dead centre fire a turn apart, unless they are more than a cycle has turns, or are stated to
 * fire together.
 */
export function firingChoice({ tops, order, cycle, stated }: FiringQuestion): FiringChoice {
  const turns = Math.round(cycle / TURN)
  const count = order.length
  const crowded = (one: number) =>
    order.filter((other) => Math.abs(wrapCentred(tops[one] - tops[other], TURN)) <= SAME).length > turns
  const together = (from: number, to: number) => {
    if (from === to) return false
    const [one, other] = [stated[order[from]], stated[order[to]]]
    if (one !== undefined && other !== undefined)
      return Math.abs(wrapCentred(one - other, cycle)) <= STATED_WITHIN
    return crowded(order[from])
  }
  /** The least angle from place `from` of the order to the next firing at place `to`. */
  const leastStep = (from: number, to: number) => {
    const step = wrapCentred(tops[order[to]] - tops[order[from]], TURN)
    if (Math.abs(step) <= SAME) return together(from, to) ? step : step + TURN
    return step < 0 ? step + TURN : step
  }
  const steps = order.map((_, place) => leastStep(place, (place + 1) % count))
  const home = order.map((_, place) => (place === 0 ? 0 : leastStep(place, 0)))

  const passed = new Float64Array(count) // angle from the first firing, by place
  let reached = -1
  let best: { events: number[]; sum: number } | null = null

  const judge = (start: number) => {
    const events = Array.from(passed, (angle) => wrap(start + angle, cycle))
    let sum = (cycle - passed[count - 1]) ** 2
    for (let place = 1; place < count; place++) sum += (passed[place] - passed[place - 1]) ** 2
    if (!best || sum < best.sum - TIE || (sum < best.sum + TIE && isEarlier(events, best.events)))
      best = { events, sum }
  }
  const explore = (place: number, start: number, angle: number) => {
    if (angle + home[place] > cycle + SAME) return
    const wanted = stated[order[place]]
    if (wanted !== undefined && Math.abs(wrapCentred(start + angle - wanted, cycle)) > STATED_WITHIN) return
    passed[place] = angle
    reached = Math.max(reached, place)
    if (place === count - 1) return judge(start)
    for (let extra = 0; extra <= turns; extra++)
      explore(place + 1, start, angle + steps[place] + extra * TURN)
  }
  for (let turn = 0; turn < turns; turn++) explore(0, tops[order[0]] + turn * TURN, 0)

  const found = best as { events: number[] } | null
  if (!found) return { ok: false, breaksAt: order[reached + 1] }
  const angles: number[] = []
  order.forEach((cylinder, place) => (angles[cylinder] = found.events[place]))
  return { ok: true, angles }
}

function isEarlier(one: readonly number[], other: readonly number[]): boolean {
  const place = one.findIndex((angle, index) => Math.abs(angle - other[index]) > TIE)
  return place >= 0 && one[place] < other[place]
}
