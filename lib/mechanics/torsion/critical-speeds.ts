import { HIGHEST } from '../analysis/orders'
import { orderStar } from '../loads/torque-orders'
import type { Train } from '../train'
import type { ShaftMode } from './shaft-modes'

/** A natural frequency met by an order of the turning moment. */
export interface CriticalSpeed {
  /** Index of the mode. */
  mode: number
  /** Per turn of the crank. */
  order: number
  /** rad/s. */
  speed: number
  /** Null where the running range is not known. */
  place: 'inside' | 'near' | 'outside' | null
}

/** rad/s. */
export interface RunningRange {
  from: number
  to: number
}

/** A critical this share below or above the running range is still near it (common practice). */
export const NEAR = 0.15

/** Idle to maximum; rated stands for a maximum, 0 for idle, that is not entered. Null without maximum and rated. */
export function runningRange({ operating: { idle = 0, rated, max = rated } }: Train): RunningRange | null {
  return max === undefined ? null : { from: Math.min(idle, max), to: max }
}

/**
 * Critical speeds ω/N of natural frequencies ω (rad/s) at orders N (above 0), by order and then by mode. `near`: from
 * 0.85 of the lower to 1.15 of the upper end of the running range, but not inside it.
 */
export const criticalSpeeds = (
  frequencies: readonly number[],
  orders: readonly number[],
  range: RunningRange | null,
): CriticalSpeed[] =>
  orders.flatMap((order) =>
    frequencies.map((frequency, mode) => {
      const speed = frequency / order
      return { mode, order, speed, place: range && placeOf(speed, range) }
    }),
  )

function placeOf(speed: number, { from, to }: RunningRange) {
  if (speed >= from && speed <= to) return 'inside'
  return speed >= (1 - NEAR) * from && speed <= (1 + NEAR) * to ? 'near' : 'outside'
}

/** ½, 1 … 12 of a four-stroke, 1, 2 … 12 of a two-stroke. */
export function usualOrders({ cycle }: Train): number[] {
  const turns = Math.round(cycle / (2 * Math.PI))
  return Array.from({ length: HIGHEST * turns }, (_, i) => (i + 1) / turns)
}

/**
 * Length of Σ δ·e^(i·N·F) over the cylinders: δ the mode’s shape at the cylinder’s throw, F its firing angle (rad), N the
 * order. At most the number of cylinders; the greater, the more the cylinders feed the mode together.
 * Source: sum of phase vectors of a torsional calculation, common practice.
 */
export function modeVectorSum(
  fires: ArrayLike<number>,
  order: number,
  { shape }: ShaftMode,
  stationOf: readonly number[],
): number {
  const { sum } = orderStar(
    fires,
    order,
    stationOf.map((station) => shape[station]),
  )
  return Math.hypot(sum.re, sum.im)
}
