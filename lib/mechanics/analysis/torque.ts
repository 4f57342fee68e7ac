import type { Plan } from '../instant'
import { signal, type Recorder, type Samples } from './recorder'

export interface Torque {
  gasNm: number[]
  inertiaNm: number[]
  totalNm: number[]
  meanNm: number
  /** Greatest magnitude of the total. */
  peakNm: number
  energyFluctuationJ: number
}

/** Torque on the crank, positive when it drives the rotation. */
export function torqueRecorder(plan: Plan, samples: Samples): Recorder<Torque> {
  const [gasNm, inertiaNm, totalNm] = [signal(samples.shown), signal(samples.shown), signal(samples.shown)]
  const total = new Float64Array(samples.all)
  return {
    record(instant, sample, shown) {
      total[sample] = instant.gasTorque + instant.inertiaTorque
      if (shown < 0) return
      gasNm[shown] = instant.gasTorque
      inertiaNm[shown] = instant.inertiaTorque
      totalNm[shown] = total[sample]
    },
    answer: () => ({
      gasNm,
      inertiaNm,
      totalNm,
      meanNm: total.reduce((sum, torque) => sum + torque, 0) / total.length,
      peakNm: total.reduce((peak, torque) => Math.max(peak, Math.abs(torque)), 0),
      energyFluctuationJ: energyFluctuation(total, plan.train.cycle),
    }),
  }
}

/**
 * Range of ∫(T − mean) dθ over a cycle of evenly spaced torques, J: what a flywheel must take up and give back
 * (turning-moment diagram). The torque is taken linear between samples, and the extremes are where it crosses its mean.
 */
export function energyFluctuation(torque: ArrayLike<number>, cycle: number): number {
  const count = torque.length
  const step = cycle / count
  let mean = 0
  for (let j = 0; j < count; j++) mean += torque[j] / count
  let [energy, least, greatest] = [0, 0, 0]
  const note = (value: number) => {
    least = Math.min(least, value)
    greatest = Math.max(greatest, value)
  }
  for (let j = 0; j < count; j++) {
    const here = torque[j] - mean
    const next = torque[(j + 1) % count] - mean
    if (here * next < 0) note(energy + (step * here * here) / (2 * (here - next)))
    energy += (step * (here + next)) / 2
    note(energy)
  }
  return greatest - least
}
