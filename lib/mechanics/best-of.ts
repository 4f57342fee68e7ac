import { compareKeys } from './interval-spread'

/** The best few of many candidates, best first, each with the keys it is ranked by. */
export interface BestOf<T> {
  readonly kept: { keys: number[]; value: T }[]
  /** True where a candidate whose keys begin so could still be kept. */
  admits(keys: readonly number[]): boolean
  add(keys: number[], value: T): void
}

export function bestOf<T>(most: number): BestOf<T> {
  const kept: { keys: number[]; value: T }[] = []
  const admits = (keys: readonly number[]) =>
    kept.length < most || compareKeys(keys, kept[kept.length - 1].keys) <= 0
  return {
    kept,
    admits,
    add(keys, value) {
      if (!admits(keys)) return
      let low = 0
      let high = kept.length
      while (low < high) {
        const middle = (low + high) >> 1
        if (compareKeys(kept[middle].keys, keys) <= 0) low = middle + 1
        else high = middle
      }
      kept.splice(low, 0, { keys, value })
      if (kept.length > most) kept.pop()
    },
  }
}
