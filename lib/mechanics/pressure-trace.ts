import type { Gas } from './train'

/** A pressure trace with its first point repeated a cycle later, so that it is linear and periodic without a case. */
export interface PressureTrace {
  angle: Float64Array
  pressure: Float64Array
}

export function pressureTrace(gas: Extract<Gas, { model: 'trace' }>, cycle: number): PressureTrace {
  return { angle: closed(gas.angle, gas.angle[0] + cycle), pressure: closed(gas.pressure, gas.pressure[0]) }
}

function closed(values: Float64Array, last: number): Float64Array {
  const all = new Float64Array(values.length + 1)
  all.set(values)
  all[values.length] = last
  return all
}

/** Pressure at `angle` from firing top dead centre, −half a cycle ≤ angle < half a cycle, linear between points. */
export function tracePressure({ angle: angles, pressure }: PressureTrace, angle: number): number {
  let low = 0
  let high = angles.length - 1
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (angles[middle] <= angle) low = middle
    else high = middle
  }
  const share = (angle - angles[low]) / (angles[high] - angles[low])
  return pressure[low] + share * (pressure[high] - pressure[low])
}
