import { fourierCoefficient, unitCircle } from '@/lib/numerics/fourier'
import { HIGHEST } from '../analysis/orders'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { handbook, massless, sampledEachDegree, steady } from './words'

/** Throws RangeError for an order that the cycle does not have. */
function orderOf({ asked, train }: Engine): { order: number; bin: number } {
  const order = asked.order ?? 1
  const turns = Math.round(train.cycle / (2 * Math.PI))
  const bin = order * turns
  if (!(Number.isInteger(bin) && bin >= 1 && order <= HIGHEST))
    throw new RangeError(
      `There is no order ${order} in this cycle: orders run from ${1 / turns} to ${HIGHEST}.`,
    )
  return { order, bin }
}

/** Amplitude of moment = amplitude × cos(order × crank angle − phase). */
export function torqueOrder(engine: Engine): Draft {
  const { order, bin } = orderOf(engine)
  const { torque } = engine.cycle()
  const { re, im } = fourierCoefficient(torque, bin, unitCircle(torque.length))
  return {
    title: `Turning moment at order ${order}`,
    quantity: 'torque',
    unit: 'N m',
    formula: '2 × root(cosine² + sine²)',
    symbols: [
      symbol('cosine', `mean of turning moment × cos(${order} × crank angle)`, re, 'N m'),
      symbol('sine', `mean of turning moment × sin(${order} × crank angle)`, -im, 'N m'),
    ],
    assumptions: [sampledEachDegree, steady, massless],
    source: 'Fourier coefficients of the turning moment; common practice of torsional calculations.',
  }
}

/** Length of the sum of the cylinders' vectors, each of length 1 at order × firing angle. */
export function orderVectorSum(engine: Engine): Draft {
  const { order } = orderOf(engine)
  const angles = Array.from(engine.plan.fires, (angle) => order * angle)
  const sum = (of: (angle: number) => number) => angles.reduce((total, angle) => total + of(angle), 0)
  return {
    title: `Vector sum of the cylinders at order ${order}`,
    quantity: 'ratio',
    unit: '',
    formula: 'root(along² + across²)',
    symbols: [
      symbol('along', `sum of cos(${order} × firing angle) of all cylinders`, sum(Math.cos)),
      symbol('across', `sum of sin(${order} × firing angle)`, sum(Math.sin)),
    ],
    assumptions: ['Every cylinder counts alike; only when it fires is looked at.'],
    source: `${handbook} Sum of phase vectors of a torsional calculation.`,
  }
}
