import type { Plan } from '../instant'
import { byId, signal, type Recorder, type Samples } from './recorder'

export interface MainLoads {
  vertical: number[]
  horizontal: number[]
  /** Greatest and mean magnitude over the cycle. */
  peakN: number
  meanN: number
}

/** Loads of the crank on its mains by the lever rule; empty with fewer than two mains. */
export function mainsRecorder(plan: Plan, samples: Samples): Recorder<Record<string, MainLoads>> {
  const mains = plan.train.mains.length < 2 ? [] : plan.train.mains
  const all = mains.map((): MainLoads => ({
    vertical: signal(samples.shown),
    horizontal: signal(samples.shown),
    peakN: 0,
    meanN: 0,
  }))
  return {
    record(instant, _, shown) {
      for (let main = 0; main < all.length; main++) {
        const out = all[main]
        const vertical = instant.mainVertical[main]
        const horizontal = instant.mainHorizontal[main]
        const magnitude = Math.hypot(vertical, horizontal)
        out.peakN = Math.max(out.peakN, magnitude)
        out.meanN += magnitude / samples.all
        if (shown < 0) continue
        out.vertical[shown] = vertical
        out.horizontal[shown] = horizontal
      }
    },
    answer: () => byId(mains, (_, index) => all[index]),
  }
}
