import type { Chamber } from './chamber'
import type { CrankUnbalance } from './crank-unbalance'
import type { DeadCentres } from './dead-centres'
import type { GasPlan } from './gas'
import type { Carried } from './lever-rule'
import type { RodMotion } from './rod-motion'
import type { RodPath } from './rod-path'
import type { Train } from './train'

/**
 * Everything the kernel knows of one crank angle, in preallocated arrays: filled by `fillInstant`, read by the
 * analysis (which only loops over it), the live figures and the arrows. SI and radians; engine frame is
 * (vertical up, horizontal towards +90°); indices are those of the train.
 */
export interface Instant {
  angle: number
  // kinematics, one entry a cylinder
  pinHeight: Float64Array // s
  travel: Float64Array // s at exact TDC − s
  velocity: Float64Array
  acceleration: Float64Array
  rodAngle: Float64Array // asin((v of the rod's big end − e)/l)
  pressure: Float64Array // absolute, Pa
  gasForce: Float64Array // net of crankcase, positive towards the crank
  // loads, cylinder frame (u up the cylinder, v to +90°)
  pistonPinU: Float64Array // the piston on the rod
  pistonPinV: Float64Array
  sideThrust: Float64Array // the piston on the wall, positive towards v
  // the rod with its bearing on the pin (0 for a link rod), engine frame
  crankPinVertical: Float64Array
  crankPinHorizontal: Float64Array
  // a link rod on its knuckle pin (0 for the others), engine frame
  knuckleVertical: Float64Array
  knuckleHorizontal: Float64Array
  // one entry a main bearing
  mainVertical: Float64Array
  mainHorizontal: Float64Array
  // engine
  gasTorque: number
  inertiaTorque: number
  /** The same by the cylinder whose piston and rod make it. */
  cylinderGasTorque: Float64Array
  cylinderInertiaTorque: Float64Array
  shakingVertical: number
  shakingHorizontal: number
  coupleVertical: number
  coupleHorizontal: number
  /** Motion of every rod per radian, in its cylinder's frame: what the rest is made from. */
  motion: RodMotion
  /** What the links put on each master rod: force, and moment about its big end. Private to fillInstant. */
  carried: { vertical: Float64Array; horizontal: Float64Array; moment: Float64Array }
}

/** What is fixed while a train runs at one speed: exact dead centres, firing angles, the gas tables, lever arms. */
export interface Plan {
  readonly train: Train
  readonly speed: number // rad/s
  readonly paths: readonly RodPath[]
  readonly centres: readonly DeadCentres[]
  /** Firing angle of each cylinder, rad. */
  readonly fires: Float64Array
  /** Cylinders with every master before its links. */
  readonly sequence: Int32Array
  readonly chambers: readonly Chamber[]
  readonly gas: GasPlan
  readonly unbalance: CrankUnbalance
  /** The mains that carry each cylinder's pin load; empty with fewer than two mains. */
  readonly carriedBy: readonly Carried[]
}
