import type { CollectorPulses } from '@/lib/mechanics/exhaust-pulses'

/** One beat of the rhythm: an exhaust opening. */
export interface Beat {
  cylinder: number
  /** Crank angle, rad, 0 ≤ x < cycle. */
  angle: number
  /** −1 left … 1 right. */
  side: number
}

/** Collectors side by side from left to right; one alone stands in the middle. */
export function beatsOf(collectors: readonly CollectorPulses[]): Beat[] {
  const last = collectors.length - 1
  return collectors
    .flatMap(({ pulses }, index) =>
      pulses.map(({ cylinder, opens }) => ({
        cylinder,
        angle: opens,
        side: last === 0 ? 0 : (2 * index) / last - 1,
      })),
    )
    .sort((one, other) => one.angle - other.angle)
}

/**
 * The beats that a crank passes from one angle to another, in the sequence in which it passes them; angles run on over
 * cycles and may fall (turning backwards). The start is not passed, the end is.
 */
export function beatsBetween(
  beats: readonly Beat[],
  cycle: number,
  from: number,
  to: number,
): { beat: Beat; angle: number }[] {
  const passed: { beat: Beat; angle: number }[] = []
  const [low, high] = from <= to ? [from, to] : [to, from]
  for (let turn = Math.floor(low / cycle); turn <= Math.floor(high / cycle); turn++)
    for (const beat of beats) {
      const angle = beat.angle + turn * cycle
      const inside = from <= to ? angle > from && angle <= to : angle >= to && angle < from
      if (inside) passed.push({ beat, angle })
    }
  return from <= to ? passed : passed.reverse()
}

/** Changes a second that the eye may be shown. */
export const MOST_CHANGES = 3

/** Whether marks that follow the beats would change too often: then they stand still. */
export const tooFastToShow = (beats: number, cycle: number, rate: number) =>
  (beats * Math.abs(rate)) / cycle > MOST_CHANGES
