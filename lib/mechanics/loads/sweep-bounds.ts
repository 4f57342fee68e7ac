import type { Train } from '../train'

/** From idle to over-speed, rad/s, and what they were taken from. */
export interface SweepBounds {
  from: number
  to: number
  /** The maximum speed of the document. */
  redline?: number
  fromIs: 'idle' | 'tenth'
  toIs: 'max' | 'rated' | 'piston-speed'
}

/** Over-speed: this much of the maximum speed. */
export const OVER_SPEED = 1.15
/** Mean piston speed that bounds a train without operating speeds, m/s: about what fast road engines reach (common practice). */
export const USUAL_PISTON_SPEED = 20

/**
 * From idle to 115 % of the maximum speed. Without a maximum the rated speed stands for it, without that the speed of
 * 20 m/s mean piston speed; without idle a tenth of the end.
 */
export function sweepBounds({ operating: { idle, rated, max } }: Train, longestTravel: number): SweepBounds {
  const to = OVER_SPEED * (max ?? rated ?? (USUAL_PISTON_SPEED * Math.PI) / longestTravel)
  return {
    from: idle !== undefined && idle < to ? idle : to / 10,
    to,
    redline: max,
    fromIs: idle !== undefined && idle < to ? 'idle' : 'tenth',
    toIs: max !== undefined ? 'max' : rated !== undefined ? 'rated' : 'piston-speed',
  }
}

/** `count` speeds (2 or more) evenly spaced from one to the other. */
export const sweepSpeeds = (from: number, to: number, count: number): number[] =>
  Array.from({ length: count }, (_, k) => from + ((to - from) * k) / (count - 1))
