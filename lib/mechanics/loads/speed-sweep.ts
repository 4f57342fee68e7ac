import { analyse } from '../analysis'
import type { CycleParts, PlaneSignal } from './cycle-parts'
import { torqueSignal } from './turning-moment'

/** What a train does at one speed; SI. */
export interface SweepPoint {
  speed: number
  /** Shaking force and couple of orders 1 and 2: major semi-axis, |forward| + |backward|. */
  force1: number
  force2: number
  couple1: number
  couple2: number
  /** Greatest size, of any piston. */
  acceleration: number
  /** Greatest pull and push along any rod, 0 or more. */
  rodTension: number
  rodCompression: number
  /** Greatest load of any pin (all its rods together) and any main. */
  pin: number
  main: number
  meanPistonSpeed: number
  meanTorque: number
  power: number
}

/** A train made ready for any number of speeds. */
export interface Sweep {
  parts: CycleParts
  perSquare: Pick<SweepPoint, 'force1' | 'force2' | 'couple1' | 'couple2' | 'acceleration'>
  longestTravel: number
  torque: { gas: number; perSquare: number }
}

/**
 * The figures that grow with ω² alone, found once at 1 rad/s; the rest is gas + ω²·inertia at every sample (`cycleParts`).
 */
export function buildSweep(parts: CycleParts): Sweep {
  const { train, plan, inertia } = parts
  const { orders } = analyse({ ...train, gas: { model: 'none' } }, { speed: 1, include: ['orders'] })
  const major = (order: number) => {
    const one = orders!.find((entry) => entry.order === order)!
    return { force: one.forwardN + one.backwardN, couple: one.forwardNm + one.backwardNm }
  }
  const [first, second] = [major(1), major(2)]
  return {
    parts,
    perSquare: {
      force1: first.force,
      force2: second.force,
      couple1: first.couple,
      couple2: second.couple,
      acceleration: Math.max(...inertia.acceleration.map((one) => one.reduce(larger, 0))),
    },
    longestTravel: Math.max(...plan.centres.map(({ topHeight, bottomHeight }) => topHeight - bottomHeight)),
    torque: { gas: mean(torqueSignal(parts, 'gas', 0)), perSquare: mean(torqueSignal(parts, 'inertia', 1)) },
  }
}

/** The figures at a speed, rad/s, 0 or more. */
export function sweepPoint({ parts, perSquare, longestTravel, torque }: Sweep, speed: number): SweepPoint {
  const { gas, inertia } = parts
  const square = speed * speed
  let [rodTension, rodCompression] = [0, 0]
  gas.rodPull.forEach((still, i) => {
    const moving = inertia.rodPull[i]
    for (let j = 0; j < still.length; j++) {
      const pull = still[j] + square * moving[j]
      if (pull > rodTension) rodTension = pull
      if (-pull > rodCompression) rodCompression = -pull
    }
  })
  const meanTorque = torque.gas + square * torque.perSquare
  return {
    speed,
    force1: square * perSquare.force1,
    force2: square * perSquare.force2,
    couple1: square * perSquare.couple1,
    couple2: square * perSquare.couple2,
    acceleration: square * perSquare.acceleration,
    rodTension,
    rodCompression,
    pin: greatest(gas.pins, inertia.pins, square),
    main: greatest(gas.mains, inertia.mains, square),
    meanPistonSpeed: (longestTravel * speed) / Math.PI,
    meanTorque,
    power: meanTorque * speed,
  }
}

function greatest(gas: readonly PlaneSignal[], inertia: readonly PlaneSignal[], square: number): number {
  let peak = 0
  gas.forEach((still, k) => {
    const moving = inertia[k]
    for (let j = 0; j < still.vertical.length; j++) {
      const vertical = still.vertical[j] + square * moving.vertical[j]
      const horizontal = still.horizontal[j] + square * moving.horizontal[j]
      peak = Math.max(peak, vertical * vertical + horizontal * horizontal)
    }
  })
  return Math.sqrt(peak)
}

const larger = (peak: number, value: number) => Math.max(peak, Math.abs(value))
const mean = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0) / values.length
