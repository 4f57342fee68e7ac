import { chambers } from './chamber'
import { crankUnbalance } from './crank-unbalance'
import { deadCentres } from './dead-centres'
import { firingAngles } from './firing'
import { cylinderPressure, gasPlan } from './gas'
import type { Instant, Plan } from './instant'
import { carriedBy } from './lever-rule'
import { fillRodLoads } from './rod-loads'
import { buildRodMotion, fillRodMotion, mastersFirst } from './rod-motion'
import { rodPaths } from './rod-path'
import type { Train } from './train'

/**
 * Prepares a train for one speed (rad/s, finite, not negative; 0 shows positions and gas forces alone).
 * Throws RangeError for another speed, and for a firing order that cannot be.
 */
export function buildPlan(train: Train, speed: number): Plan {
  if (!Number.isFinite(speed) || speed < 0)
    throw new RangeError(`The speed must be 0 or more, not ${speed} rad/s.`)
  const paths = rodPaths(train)
  const centres = deadCentres(paths)
  const fires = Float64Array.from(firingAngles(train, centres))
  const spaces = chambers(train, paths, centres, fires)
  return {
    train,
    speed,
    paths,
    centres,
    fires,
    sequence: mastersFirst(paths),
    chambers: spaces,
    gas: gasPlan(train, spaces),
    unbalance: crankUnbalance(train),
    carriedBy:
      train.mains.length < 2 ? [] : train.cylinders.map(({ axial }) => carriedBy(train.mains, axial)),
  }
}

/** The arrays that `fillInstant` fills: one set serves any number of angles. */
export function buildInstant({ train }: Plan): Instant {
  const each = () => new Float64Array(train.cylinders.length)
  const main = () => new Float64Array(train.mains.length)
  return {
    angle: 0,
    pinHeight: each(),
    travel: each(),
    velocity: each(),
    acceleration: each(),
    rodAngle: each(),
    pressure: each(),
    gasForce: each(),
    pistonPinU: each(),
    pistonPinV: each(),
    sideThrust: each(),
    crankPinVertical: each(),
    crankPinHorizontal: each(),
    knuckleVertical: each(),
    knuckleHorizontal: each(),
    mainVertical: main(),
    mainHorizontal: main(),
    gasTorque: 0,
    inertiaTorque: 0,
    cylinderGasTorque: each(),
    cylinderInertiaTorque: each(),
    shakingVertical: 0,
    shakingHorizontal: 0,
    coupleVertical: 0,
    coupleHorizontal: 0,
    motion: buildRodMotion(train.cylinders.length),
    carried: { vertical: each(), horizontal: each(), moment: each() },
  }
}

/** Everything at crank angle `angle` (rad, any value). Allocates nothing. */
export function fillInstant(out: Instant, plan: Plan, angle: number): void {
  out.angle = angle
  const cos = Math.cos(angle)
  const sin = Math.sin(angle)
  fillKinematics(out, plan, cos, sin)
  fillGas(out, plan, angle)
  fillRotating(out, plan, angle, cos, sin)
  out.gasTorque = 0
  out.inertiaTorque = 0
  out.carried.vertical.fill(0)
  out.carried.horizontal.fill(0)
  out.carried.moment.fill(0)
  for (let k = plan.sequence.length - 1; k >= 0; k--) fillRodLoads(out, plan, plan.sequence[k])
}

function fillKinematics(out: Instant, plan: Plan, cos: number, sin: number): void {
  const { motion } = out
  const { paths, sequence, speed } = plan
  for (let k = 0; k < sequence.length; k++) {
    const i = sequence[k]
    fillRodMotion(motion, paths, i, cos, sin)
    out.pinHeight[i] = motion.pin[i]
    out.travel[i] = plan.centres[i].topHeight - motion.pin[i]
    out.velocity[i] = motion.pin1[i] * speed
    out.acceleration[i] = motion.pin2[i] * speed * speed
    out.rodAngle[i] = Math.asin(motion.sin[i])
  }
}

function fillGas(out: Instant, plan: Plan, angle: number): void {
  const { train, chambers: spaces } = plan
  for (let i = 0; i < spaces.length; i++) {
    const pressure = cylinderPressure(train, plan.gas, spaces[i], angle, out.travel[i])
    out.pressure[i] = pressure
    out.gasForce[i] = (pressure - train.crankcasePressure) * spaces[i].area
  }
}

/** Throws and counterweights turn with the crank, balance shafts at their own ratio; all at constant speed. */
function fillRotating(out: Instant, plan: Plan, angle: number, cos: number, sin: number): void {
  const { unbalance, train, speed } = plan
  const square = speed * speed
  out.shakingVertical = square * (unbalance.vertical * cos - unbalance.horizontal * sin)
  out.shakingHorizontal = square * (unbalance.vertical * sin + unbalance.horizontal * cos)
  out.coupleVertical = square * (unbalance.coupleVertical * cos - unbalance.coupleHorizontal * sin)
  out.coupleHorizontal = square * (unbalance.coupleVertical * sin + unbalance.coupleHorizontal * cos)
  for (let main = 0; main < out.mainVertical.length; main++) {
    const { mainVertical, mainHorizontal } = unbalance
    out.mainVertical[main] = square * (mainVertical[main] * cos - mainHorizontal[main] * sin)
    out.mainHorizontal[main] = square * (mainVertical[main] * sin + mainHorizontal[main] * cos)
  }
  for (let k = 0; k < train.balanceShafts.length; k++) {
    const shaft = train.balanceShafts[k]
    const force = shaft.unbalance * shaft.speedRatio * shaft.speedRatio * square
    const stand = shaft.speedRatio * angle + shaft.angle
    const vertical = force * Math.cos(stand)
    const horizontal = force * Math.sin(stand)
    const arm = shaft.axial - train.referenceAxial
    out.shakingVertical += vertical
    out.shakingHorizontal += horizontal
    out.coupleVertical += arm * vertical
    out.coupleHorizontal += arm * horizontal
  }
}
