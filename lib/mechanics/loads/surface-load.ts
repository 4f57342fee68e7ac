/** A sector of a surface from one angle on in the direction of rotation, rad, and what presses on it, N. */
export interface Sector {
  from: number
  to: number
  middle: number
  /** Mean over the cycle and the sector of what presses, N. */
  mean: number
  /** The same as a share of the mean all round; 0 where nothing presses anywhere. */
  share: number
}

const POINTS = 360

/**
 * How hard each point of a journal's or bearing's surface is pressed, N, at 360 points from 0° of the load's frame on:
 * w(δ) = mean over the cycle of max(0, p·F·cos(∠F − δ)) = max(0, p·(F_x cos δ + F_y sin δ)), x towards 0°, y towards +90°,
 * p = +1 where the side along the load is pressed and −1 where the side against it is. A rigid journal, no oil film.
 */
export function surfaceLoad(x: Float64Array, y: Float64Array, pressed: 1 | -1): Float64Array {
  const count = x.length
  return Float64Array.from({ length: POINTS }, (_, point) => {
    const cos = (pressed * Math.cos((2 * Math.PI * point) / POINTS)) / count
    const sin = (pressed * Math.sin((2 * Math.PI * point) / POINTS)) / count
    let sum = 0
    for (let j = 0; j < count; j++) {
      const press = x[j] * cos + y[j] * sin
      if (press > 0) sum += press
    }
    return sum
  })
}

/**
 * The sector of this width (rad, up to a whole turn) with the least of a surface load in it, its edges on its points;
 * where many are as good, the one in the middle of the longest run of them.
 */
export function leastLoadedSector(surface: Float64Array, width = Math.PI / 3): Sector {
  const count = surface.length
  const step = (2 * Math.PI) / count
  const span = Math.max(1, Math.round(width / step))
  // trapezoids: the points at both edges count half
  const sums = Float64Array.from(surface, (first, from) => {
    let sum = (first + surface[(from + span) % count]) / 2
    for (let k = 1; k < span; k++) sum += surface[(from + k) % count]
    return sum / span
  })
  const mean = surface.reduce((sum, press) => sum + press, 0) / count
  const start = middleOfLeast(sums, 1e-9 * mean)
  const from = start * step
  return {
    from,
    to: from + span * step,
    middle: (from + (span * step) / 2) % (2 * Math.PI),
    mean: sums[start],
    share: mean > 0 ? sums[start] / mean : 0,
  }
}

function middleOfLeast(sums: Float64Array, tolerance: number): number {
  const count = sums.length
  const limit = Math.min(...sums) + tolerance
  const good = (k: number) => sums[k % count] <= limit
  let edge = 0
  while (edge < count && good(edge)) edge++
  if (edge === count) return 0
  let [best, longest, run] = [0, 0, 0]
  for (let k = edge; k <= edge + count; k++) {
    if (good(k)) run++
    else {
      if (run > longest) [best, longest] = [k - 1 - Math.floor((run - 1) / 2), run]
      run = 0
    }
  }
  return best % count
}
