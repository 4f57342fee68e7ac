import type { Plan } from '../instant'
import { BAR, byId, signal, type Recorder, type Samples } from './recorder'

export interface CylinderGas {
  /** Absolute. */
  pressureBar: number[]
}

export function gasRecorder(plan: Plan, { shown: count }: Samples): Recorder<Record<string, CylinderGas>> {
  const all = plan.train.cylinders.map((): CylinderGas => ({ pressureBar: signal(count) }))
  return {
    record(instant, _, shown) {
      if (shown < 0) return
      for (let i = 0; i < all.length; i++) all[i].pressureBar[shown] = instant.pressure[i] * BAR
    },
    answer: () => byId(plan.train.cylinders, (_, index) => all[index]),
  }
}
