import { energyFluctuation } from '../analysis/torque'
import type { CycleParts } from './cycle-parts'
import { signalAt, type LoadPart } from './part-signals'

/** A torque along one cycle in a few figures; N m, rad, J. */
export interface MomentFigures {
  mean: number
  most: { value: number; angle: number }
  least: { value: number; angle: number }
  /** Range of ∫(T − mean) dθ: see `energyFluctuation`. */
  energy: number
}

/** Figures of evenly spaced torques over a cycle (rad). Power is mean × speed. */
export function momentFigures(torque: ArrayLike<number>, cycle: number): MomentFigures {
  const count = torque.length
  let [sum, most, least] = [0, 0, 0]
  for (let j = 0; j < count; j++) {
    sum += torque[j]
    if (torque[j] > torque[most]) most = j
    if (torque[j] < torque[least]) least = j
  }
  const at = (j: number) => ({ value: torque[j], angle: (cycle * j) / count })
  return { mean: sum / count, most: at(most), least: at(least), energy: energyFluctuation(torque, cycle) }
}

/** Torque of these cylinders together (indices; default all) at a speed, rad/s; N m, positive when it drives. */
export function torqueSignal(
  { train, angle, gas, inertia }: CycleParts,
  part: LoadPart,
  speed: number,
  cylinders: readonly number[] = train.cylinders.map((_, index) => index),
): Float64Array {
  const sum = new Float64Array(angle.length)
  for (const i of cylinders) {
    const one = signalAt(gas.torque[i], inertia.torque[i], part, speed)
    for (let j = 0; j < sum.length; j++) sum[j] += one[j]
  }
  return sum
}

/** The cylinders of a bank, as indices. */
export const bankCylinders = ({ train }: CycleParts, bank: number): number[] =>
  train.cylinders.flatMap((cylinder, index) => (cylinder.bank === bank ? [index] : []))
