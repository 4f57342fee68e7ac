import { signal, type Recorder, type Samples } from './recorder'

/** What the crank train exerts on the engine's frame by inertia alone; couples about the reference place. */
export interface Shaking {
  verticalN: number[]
  horizontalN: number[]
  coupleVerticalNm: number[]
  coupleHorizontalNm: number[]
}

export function shakingRecorder({ shown: count }: Samples): Recorder<Shaking> {
  const out: Shaking = {
    verticalN: signal(count),
    horizontalN: signal(count),
    coupleVerticalNm: signal(count),
    coupleHorizontalNm: signal(count),
  }
  return {
    record(instant, _, shown) {
      if (shown < 0) return
      out.verticalN[shown] = instant.shakingVertical
      out.horizontalN[shown] = instant.shakingHorizontal
      out.coupleVerticalNm[shown] = instant.coupleVertical
      out.coupleHorizontalNm[shown] = instant.coupleHorizontal
    },
    answer: () => out,
  }
}
