/** How close to the end of a period an angle counts as its beginning, rad: rounding never turns 0 into a whole turn. */
const SEAM = 1e-9

/**
 * `angle` brought into 0 ≤ x < period. An angle within 1e-9 rad below a whole period is 0.
 * Any finite angle, period > 0.
 */
export function wrap(angle: number, period: number): number {
  const rest = angle - period * Math.floor(angle / period)
  return rest >= period - SEAM || rest < 0 ? 0 : rest
}

/** `angle` brought into −period/2 ≤ x < period/2, with the same seam. */
export function wrapCentred(angle: number, period: number): number {
  return wrap(angle + period / 2, period) - period / 2
}
