import { stepsPerTurn } from '../analysis'
import { massSplit } from '../balance'
import type { Instant, Plan } from '../instant'
import { buildInstant, buildPlan, fillInstant } from '../plan'
import type { Train } from '../train'

/** A force in the engine frame along one cycle, N. */
export interface PlaneSignal {
  vertical: Float64Array
  horizontal: Float64Array
}

/** What loads a train's bearings and turns its crank along one cycle; N, N m, rad, m/s². */
export interface LoadSignals {
  /** Each rod with its bearing on its pin, or a link rod on its knuckle. */
  rods: PlaneSignal[]
  /** All rods of a throw together on its pin. */
  pins: PlaneSignal[]
  /** The crank on each main by the lever rule; empty with fewer than two mains. */
  mains: PlaneSignal[]
  /** Torque that each cylinder puts on the crank. */
  torque: Float64Array[]
  /** Force along each rod as two masses, pull positive: −(F + m s″)/cos ψ, m the reciprocating mass. */
  rodPull: Float64Array[]
  /** Of each piston, along its cylinder. */
  acceleration: Float64Array[]
  /** Angular acceleration of each rod, positive in the direction of rotation. */
  rodTurn: Float64Array[]
}

/** A cycle taken apart: at speed ω every signal is gas + ω²·inertia, for the pressure does not depend on the speed. */
export interface CycleParts {
  train: Train
  /** Of the train as it stands still: dead centres, firing angles. */
  plan: Plan
  /** Crank angles from 0 to the end of the cycle, left out, rad. */
  angle: Float64Array
  /** Angle ψ of each rod at these, rad. */
  rodAngle: Float64Array[]
  gas: LoadSignals
  /** At 1 rad/s. */
  inertia: LoadSignals
}

/**
 * Gas and inertia apart, at every `stepDeg` of crank angle (divides 360, `LEAST_STEP_DEG` or more, else RangeError): the
 * Newton–Euler equations are linear in both, so one standing run with gas and one run at 1 rad/s without serve every speed.
 */
export function cycleParts(train: Train, stepDeg = 1): CycleParts {
  const count = Math.round(stepsPerTurn(stepDeg) * (train.cycle / (2 * Math.PI)))
  const angle = Float64Array.from({ length: count }, (_, j) => (train.cycle * j) / count)
  const plan = buildPlan(train, 0)
  const still = sampled(plan, angle)
  const moving = sampled(buildPlan({ ...train, gas: { model: 'none' } }, 1), angle)
  return { train, plan, angle, rodAngle: still.rodAngle, gas: still.signals, inertia: moving.signals }
}

function sampled(plan: Plan, angle: Float64Array) {
  const { cylinders, throws, mains } = plan.train
  const array = () => new Float64Array(angle.length)
  const plane = (): PlaneSignal => ({ vertical: array(), horizontal: array() })
  const signals: LoadSignals = {
    rods: cylinders.map(plane),
    pins: throws.map(plane),
    mains: mains.length < 2 ? [] : mains.map(plane),
    torque: cylinders.map(array),
    rodPull: cylinders.map(array),
    acceleration: cylinders.map(array),
    rodTurn: cylinders.map(array),
  }
  const rodAngle = cylinders.map(array)
  const reciprocating = cylinders.map((cylinder) => massSplit(cylinder).reciprocating)
  const instant = buildInstant(plan)
  for (let j = 0; j < angle.length; j++) {
    fillInstant(instant, plan, angle[j])
    for (let i = 0; i < cylinders.length; i++) {
      record(signals, plan, instant, i, j, reciprocating[i])
      rodAngle[i][j] = instant.rodAngle[i]
    }
    for (let k = 0; k < signals.mains.length; k++) {
      signals.mains[k].vertical[j] = instant.mainVertical[k]
      signals.mains[k].horizontal[j] = instant.mainHorizontal[k]
    }
  }
  return { signals, rodAngle }
}

function record(
  out: LoadSignals,
  { train, paths, speed }: Plan,
  at: Instant,
  i: number,
  j: number,
  mass: number,
) {
  const link = paths[i].master >= 0
  const vertical = link ? at.knuckleVertical[i] : at.crankPinVertical[i]
  const horizontal = link ? at.knuckleHorizontal[i] : at.crankPinHorizontal[i]
  out.rods[i].vertical[j] = vertical
  out.rods[i].horizontal[j] = horizontal
  if (!link) {
    const pin = out.pins[train.cylinders[i].throw]
    pin.vertical[j] += vertical
    pin.horizontal[j] += horizontal
  }
  out.torque[i][j] = at.cylinderGasTorque[i] + at.cylinderInertiaTorque[i]
  out.rodPull[i][j] = -(at.gasForce[i] + mass * at.acceleration[i]) / at.motion.cos[i]
  out.acceleration[i][j] = at.acceleration[i]
  out.rodTurn[i][j] = -at.motion.angle2[i] * speed * speed
}
