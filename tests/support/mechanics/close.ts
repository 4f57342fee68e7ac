import { expect } from 'vitest'

/** Greatest distance between two signals as a share of the peak of the second, or of `scale` where that is larger. */
export function worstShare(actual: ArrayLike<number>, wanted: ArrayLike<number>, scale = 0) {
  if (actual.length !== wanted.length) return Infinity
  let [gap, peak] = [0, scale]
  for (let i = 0; i < wanted.length; i++) {
    const off = Math.abs(actual[i] - wanted[i])
    if (!(off <= gap)) gap = Number.isNaN(off) ? Infinity : off
    peak = Math.max(peak, Math.abs(wanted[i]))
  }
  return gap === 0 ? 0 : gap / peak
}

/** Two signals agree within a share of the peak. */
export function expectClose(
  name: string,
  actual: ArrayLike<number>,
  wanted: ArrayLike<number>,
  share: number,
  scale = 0,
) {
  expect(worstShare(actual, wanted, scale), name).toBeLessThanOrEqual(share)
}

/** The gap between two angles, degrees, across the seam of a turn or cycle. */
export const angleGap = (a: number, b: number, turn = 360) => {
  const gap = (((a - b) % turn) + turn) % turn
  return Math.min(gap, turn - gap)
}
