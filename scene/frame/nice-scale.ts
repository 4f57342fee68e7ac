import type { Rig } from './types'

/** The page's one scale of force: metres of the engine's world a newton, and the bar that says so. */
export interface ForceScale {
  metresPerNewton: number
  /** N; a round figure in the unit asked for. */
  legendForce: number
  /** m in the world. */
  legendLength: number
}

/** The largest arrow is at most this share of the height from crank axis to deck. */
const LARGEST = 0.6
/** The legend's bar is at most this share of the largest arrow. */
const BAR = 0.4

/** The least of 1, 2 or 5 times a power of ten that is not below the value. */
export function niceAbove(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value))
  // a hair of room, so that rounding does not push 5 to 10
  const times = [1, 2, 5].find((step) => step * power >= value * (1 - 1e-12))
  return (times ?? 10) * power
}

export function niceBelow(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value))
  const times = [5, 2, 1].find((step) => step * power <= value * (1 + 1e-12))
  return (times ?? 1) * power
}

/** Height of the highest firing point above the crank axis: the size that arrows are measured against. */
export const boreStack = (rig: Rig): number =>
  Math.max(...rig.anchors.firing.map(([x, y]) => Math.hypot(x, y)))

/**
 * A scale in round steps, so that it holds still while the speed is changed a little: so many newtons (or `unit`s) a
 * bore-stack, a round number, and the largest arrow between 0.24 and 0.6 of it.
 */
export function niceScale(peakForce: number, stack: number, unit = 1): ForceScale {
  const peak = Math.max(peakForce / unit, 1e-9)
  const perStack = niceAbove(peak / LARGEST)
  const metres = stack / perStack
  const legend = niceBelow(BAR * LARGEST * perStack)
  return { metresPerNewton: metres / unit, legendForce: legend * unit, legendLength: legend * metres }
}
