import { units } from '@/lib/units/units'
import type { Instant } from '../instant'

/**
 * One part of an analysis while its angles go by. `shown` is the place among the angles of the answer, or −1 for an
 * angle in between, which only sums and peaks are taken from; `sample` counts all of them.
 */
export interface Recorder<T> {
  record(instant: Instant, sample: number, shown: number): void
  answer(): T
}

/** How many angles there are. */
export interface Samples {
  all: number
  shown: number
}

export const DEGREES = 1 / units['°'].factor
export const MM = 1000
export const BAR = 1 / units.bar.factor
export const KG_MM = 1 / units['kg mm'].factor
export const KG_MM2 = 1 / units['kg mm²'].factor

/** Not zeros: an angle left out would show. */
export const signal = (length: number): number[] => new Array<number>(length).fill(NaN)

/** An object with an entry for each item, by its id. */
export const byId = <I extends { id: string }, T>(
  items: readonly I[],
  value: (item: I, index: number) => T,
): Record<string, T> => Object.fromEntries(items.map((item, index) => [item.id, value(item, index)]))
