import type { PlaneSignal } from './cycle-parts'

/** A load in a few figures; N, rad, Pa. */
export interface LoadFigures {
  peak: number
  /** Crank angle of the peak, and its sample. */
  peakAngle: number
  peakSample: number
  /** Mean magnitude over the cycle. */
  mean: number
  /** Greatest load on the projected area d·l; undefined without one. */
  specific?: number
}

/** Peak and mean of |F| over evenly spaced samples of a cycle, and the peak on a projected area (m²). */
export function loadFigures(load: PlaneSignal, angle: Float64Array, area?: number): LoadFigures {
  const count = angle.length
  let [peak, peakSample, sum] = [-1, 0, 0]
  for (let j = 0; j < count; j++) {
    const size = Math.hypot(load.vertical[j], load.horizontal[j])
    sum += size
    if (size > peak) [peak, peakSample] = [size, j]
  }
  return {
    peak,
    peakSample,
    peakAngle: angle[peakSample],
    mean: sum / count,
    specific: area === undefined ? undefined : peak / area,
  }
}
