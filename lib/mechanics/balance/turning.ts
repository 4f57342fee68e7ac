import { fourierCoefficient, unitCircle, type Complex } from '@/lib/numerics/fourier'
import type { Order } from '../analysis/orders'
import { DEGREES } from '../analysis/recorder'
import type { Phasor } from '../balance'
import { buildInstant, buildPlan, fillInstant } from '../plan'
import type { Train } from '../train'
import { complex, phasor } from './phasor'

/**
 * One order of a force (N) or couple (N m) as it turns: f·e^(ikθ) + b·e^(−ikθ), vertical + i·horizontal. The path is an
 * ellipse with half axes |f| + |b| and ||f| − |b||, its long axis at (arg f + arg b)/2 (direct and reverse cranks).
 */
export interface Turning {
  forward: Phasor
  backward: Phasor
  major: number
  minor: number
  /** Of the long axis, rad, 0 ≤ x < π; 0 for a circle. */
  tilt: number
}

const CIRCLE = 1e-9

export function turning(forward: Complex, backward: Complex): Turning {
  const [f, b] = [phasor(forward), phasor(backward)]
  const minor = Math.abs(f.size - b.size)
  const major = f.size + b.size
  const isCircle = Math.min(f.size, b.size) <= CIRCLE * major
  const middle = (f.angle + b.angle) / 2
  const tilt = isCircle ? 0 : middle - Math.PI * Math.floor(middle / Math.PI)
  return { forward: f, backward: b, major, minor, tilt: tilt > Math.PI - CIRCLE ? 0 : tilt }
}

/** From the coefficients c_k of vertical and horizontal: forward c_v + i·c_h, backward their conjugates so combined. */
const turningFrom = (v: Complex, h: Complex): Turning =>
  turning({ re: v.re - h.im, im: v.im + h.re }, { re: v.re + h.im, im: h.re - v.im })

/** The orders that balancing speaks of. */
export const balanceOrders = [1, 2, 4, 6] as const
export type BalanceOrder = (typeof balanceOrders)[number]

export interface OrderTurning {
  order: BalanceOrder
  force: Turning
  couple: Turning
}

/** Over one turn: orders beyond half of this are far below rounding for any rod that turns. */
const SAMPLES = 180

/**
 * Shaking force and couple by order from the exact motion, at 1 rad/s: N there is kg m, and N m is kg m². Times ω² they
 * are those at any speed, for inertia at constant speed grows with its square and repeats every turn.
 */
export function exactOrders(train: Train): OrderTurning[] {
  const plan = buildPlan({ ...train, gas: { model: 'none' } }, 1)
  const instant = buildInstant(plan)
  const signals = [0, 1, 2, 3].map(() => new Float64Array(SAMPLES))
  for (let sample = 0; sample < SAMPLES; sample++) {
    fillInstant(instant, plan, (2 * Math.PI * sample) / SAMPLES)
    signals[0][sample] = instant.shakingVertical
    signals[1][sample] = instant.shakingHorizontal
    signals[2][sample] = instant.coupleVertical
    signals[3][sample] = instant.coupleHorizontal
  }
  const circle = unitCircle(SAMPLES)
  return balanceOrders.map((order) => {
    const [v, h, cv, ch] = signals.map((signal) => fourierCoefficient(signal, order, circle))
    return { order, force: turningFrom(v, h), couple: turningFrom(cv, ch) }
  })
}

/** The orders of an analysis that balancing speaks of, by their senses: N and N m. */
export const turningOrders = (orders: readonly Order[]): OrderTurning[] =>
  balanceOrders.flatMap((order) => {
    const found = orders.find((one) => one.order === order)
    return found ? [{ order, ...orderTurning(found) }] : []
  })

/** c = (A/2)·e^(−i·phase) of A·cos(kθ − phase). */
const coefficient = (amplitude: number, phaseDeg: number): Complex =>
  complex({ size: amplitude / 2, angle: -phaseDeg / DEGREES })

const orderTurning = (order: Order): Pick<OrderTurning, 'force' | 'couple'> => ({
  force: turningFrom(
    coefficient(order.vertical.amplitudeN, order.vertical.phaseDeg),
    coefficient(order.horizontal.amplitudeN, order.horizontal.phaseDeg),
  ),
  couple: turningFrom(
    coefficient(order.coupleVertical.amplitudeNm, order.coupleVertical.phaseDeg),
    coefficient(order.coupleHorizontal.amplitudeNm, order.coupleHorizontal.phaseDeg),
  ),
})

/** The same without counterweights and balance shafts. */
export const bare = (train: Train): Train => ({ ...train, counterweights: [], balanceShafts: [] })
