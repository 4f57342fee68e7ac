import {
  fourierCoefficient,
  harmonicOf,
  unitCircle,
  type Complex,
  type Harmonic,
} from '@/lib/numerics/fourier'
import { HIGHEST } from '../analysis/orders'

/** One order k per crank revolution: A·cos(kθ − phase), N m and rad. */
export interface TorqueOrder extends Harmonic {
  order: number
}

/**
 * Orders of evenly spaced torques over a cycle (rad): ½, 1, 1½ … 12 of a four-stroke, 1, 2 … 12 of a two-stroke. More
 * than 48 samples a cycle (24), or a bin would be at half their number.
 */
export function torqueOrders(torque: ArrayLike<number>, cycle: number): TorqueOrder[] {
  const turns = Math.round(cycle / (2 * Math.PI))
  const circle = unitCircle(torque.length)
  return Array.from({ length: HIGHEST * turns }, (_, index) => ({
    order: (index + 1) / turns,
    ...harmonicOf(fourierCoefficient(torque, index + 1, circle)),
  }))
}

/** Vectors of the cylinders at one order, x to the right at phase 0, and their sum. */
export interface OrderStar {
  vectors: Complex[]
  sum: Complex
  /** All cylinders in phase: see `IN_PHASE`. */
  major: boolean
}

/** An order is a major one when no cylinder's vector is further from their sum than this, rad: each adds 94 % of its length or more. */
export const IN_PHASE = (20 * Math.PI) / 180

/**
 * Phase vectors of an order: e^(i·order·F) for each firing angle F (rad), times a length where the cylinders differ (default 1), their sum, and whether all are in phase.
 * Source: sum of phase vectors of a torsional calculation, common practice.
 */
export function orderStar(fires: ArrayLike<number>, order: number, lengths?: ArrayLike<number>): OrderStar {
  const vectors = Array.from(fires, (angle, i): Complex => {
    const length = lengths ? lengths[i] : 1
    return { re: length * Math.cos(order * angle), im: length * Math.sin(order * angle) }
  })
  const sum = vectors.reduce((all, { re, im }) => ({ re: all.re + re, im: all.im + im }), { re: 0, im: 0 })
  const size = Math.hypot(sum.re, sum.im)
  const major = vectors.every(
    ({ re, im }) =>
      re * sum.re + im * sum.im >= Math.cos(IN_PHASE) * Math.hypot(re, im) * size && size > 1e-9,
  )
  return { vectors, sum, major }
}
