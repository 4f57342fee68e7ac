import type { Behind } from '@/components/figures/behind'
import { DEGREES } from '@/components/figures/axis'
import type { CycleParts, PlaneSignal } from '@/lib/mechanics/loads/cycle-parts'
import { planeAt, signalAt } from '@/lib/mechanics/loads/part-signals'
import type { SweepPoint } from '@/lib/mechanics/loads/speed-sweep'

/** What stands behind each figure of a sweep at one speed: the extremes are those of the part and the moment that have them. */
export function behindSweep(
  parts: CycleParts,
  speed: number,
): Record<Exclude<keyof SweepPoint, 'speed'>, Behind> {
  const { train, angle, gas, inertia } = parts
  const rods = (list: 'rodPull' | 'acceleration', size: (value: number) => number) => {
    const { index, sample } = greatest(
      gas[list].map((still, i) => signalAt(still, inertia[list][i], 'total', speed).map(size)),
    )
    return { cylinder: train.cylinders[index].id, angleDeg: angle[sample] * DEGREES }
  }
  const sizes = (still: PlaneSignal[], moving: PlaneSignal[]) =>
    still.map((one, i) => {
      const { vertical, horizontal } = planeAt(one, moving[i], 'total', speed)
      return vertical.map((up, j) => Math.hypot(up, horizontal[j]))
    })
  const pin = greatest(sizes(gas.pins, inertia.pins)).index
  return {
    force1: { figure: 'order-long-axis', order: 1 },
    force2: { figure: 'order-long-axis', order: 2 },
    couple1: { figure: 'order-couple-long-axis', order: 1 },
    couple2: { figure: 'order-couple-long-axis', order: 2 },
    acceleration: { figure: 'piston-acceleration', ...rods('acceleration', Math.abs) },
    rodTension: { figure: 'rod-pull', ...rods('rodPull', (pull) => pull) },
    rodCompression: { figure: 'rod-pull', ...rods('rodPull', (pull) => -pull) },
    pin: { figure: 'bearing-peak', throw: train.throws[pin].id },
    main: 'main-peak',
    meanPistonSpeed: 'mean-piston-speed',
    meanTorque: 'torque-mean',
    power: 'mean-power',
  }
}

/** Where the greatest of several signals stands. */
function greatest(signals: readonly Float64Array[]): { index: number; sample: number } {
  let [index, sample] = [0, 0]
  signals.forEach((signal, i) =>
    signal.forEach((value, j) => {
      if (value > signals[index][sample]) [index, sample] = [i, j]
    }),
  )
  return { index, sample }
}
