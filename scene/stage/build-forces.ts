import { firingEvents } from '@/lib/mechanics/firing'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import type { Instant, Plan } from '@/lib/mechanics/instant'
import type { Train } from '@/lib/mechanics/train'
import type { Forces } from './types'

/** A couple below this share of the largest force over the crank's length does not rock anything: it is no full arc. */
const leastFull = 0.03

const crankLength = ({ cylinders, throws }: Train): number => {
  const places = [...cylinders, ...throws].map(({ axial }) => axial)
  return Math.max(...places) - Math.min(...places)
}

/** Crank angle between two looks at the forces, rad. */
const step = Math.PI / 180

/** Forces and firings of a train at one speed, rad/s. */
export function buildForces(train: Train, speed: number): Forces {
  const plan = buildPlan(train, speed)
  return { plan, events: firingEvents(train), ...sweep(plan) }
}

type Sweep = Pick<Forces, 'peakForce' | 'fullCouple' | 'peakPressure' | 'orbit'>

/** One cycle's peaks, and the path of the shaking force. */
function sweep(plan: Plan): Sweep {
  const instant = buildInstant(plan)
  const count = Math.round(plan.train.cycle / step)
  const orbit = new Float64Array(2 * count)
  let peakForce = 0
  let peakCouple = 0
  let peakPressure = 0
  for (let i = 0; i < count; i++) {
    fillInstant(instant, plan, i * step)
    orbit[2 * i] = instant.shakingVertical
    orbit[2 * i + 1] = instant.shakingHorizontal
    peakForce = Math.max(peakForce, largestForce(instant))
    peakCouple = Math.max(peakCouple, Math.hypot(instant.coupleVertical, instant.coupleHorizontal))
    for (const pressure of instant.pressure) peakPressure = Math.max(peakPressure, pressure)
  }
  const fullCouple = Math.max(peakCouple, leastFull * peakForce * crankLength(plan.train))
  return { peakForce, fullCouple, peakPressure, orbit }
}

function largestForce(instant: Instant): number {
  let most = Math.hypot(instant.shakingVertical, instant.shakingHorizontal)
  for (const force of instant.gasForce) most = Math.max(most, Math.abs(force))
  const pairs = [
    [instant.pistonPinU, instant.pistonPinV],
    [instant.crankPinVertical, instant.crankPinHorizontal],
    [instant.mainVertical, instant.mainHorizontal],
  ]
  for (const [one, other] of pairs)
    for (let i = 0; i < one.length; i++) most = Math.max(most, Math.hypot(one[i], other[i]))
  return most
}
