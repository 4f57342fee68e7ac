/** Small sums over one cycle of a signal. */
export interface Extreme {
  value: number
  at: number
}

export function most(values: ArrayLike<number>, angles: ArrayLike<number>): Extreme {
  let best = 0
  for (let i = 1; i < values.length; i++) if (values[i] > values[best]) best = i
  return { value: values[best], at: angles[best] }
}

export function least(values: ArrayLike<number>, angles: ArrayLike<number>): Extreme {
  let best = 0
  for (let i = 1; i < values.length; i++) if (values[i] < values[best]) best = i
  return { value: values[best], at: angles[best] }
}

export function size(one: ArrayLike<number>, other: ArrayLike<number>): Float64Array {
  const out = new Float64Array(one.length)
  for (let i = 0; i < out.length; i++) out[i] = Math.hypot(one[i], other[i])
  return out
}

export const largest = (values: ArrayLike<number>): number => {
  let peak = 0
  for (let i = 0; i < values.length; i++) if (Math.abs(values[i]) > peak) peak = Math.abs(values[i])
  return peak
}
