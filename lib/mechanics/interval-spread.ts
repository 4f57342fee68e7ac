/** How uneven a row of intervals is, in the unit of the intervals; 0 for an even one. */
export interface IntervalSpread {
  /** Greatest less least interval. */
  spread: number
  /** Root of the mean square of what each interval differs from their mean by. */
  rms: number
}

/** `intervals` close one cycle; none at all are even. */
export function intervalSpread(intervals: readonly number[]): IntervalSpread {
  if (intervals.length === 0) return { spread: 0, rms: 0 }
  const mean = intervals.reduce((sum, interval) => sum + interval, 0) / intervals.length
  const square = intervals.reduce((sum, interval) => sum + (interval - mean) ** 2, 0) / intervals.length
  return { spread: Math.max(...intervals) - Math.min(...intervals), rms: Math.sqrt(square) }
}

/** An angle as a key of a ranking: figures that differ by rounding alone are equal. */
export const rankKey = (angle: number) => Math.round(angle * 1e7)

/** Compares two rows of keys, the first that differs deciding. */
export function compareKeys(one: readonly number[], other: readonly number[]): number {
  for (let at = 0; at < one.length; at++) if (one[at] !== other[at]) return one[at] - other[at]
  return 0
}
