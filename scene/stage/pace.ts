/**
 * Watches the time between frames that were drawn one after another. Poor means: over a second of such frames, half of
 * them or more took longer than 50 ms.
 */
export interface Pace {
  /** Seconds since the frame before; true when the last second was poor. */
  add(seconds: number): boolean
  reset(): void
}

const slow = 0.05
const span = 1

export function createPace(): Pace {
  let total = 0
  let frames = 0
  let slowFrames = 0
  const reset = () => {
    total = 0
    frames = 0
    slowFrames = 0
  }
  return {
    reset,
    add(seconds) {
      if (seconds <= 0) return false
      total += seconds
      frames++
      if (seconds > slow) slowFrames++
      if (total < span) return false
      const poor = slowFrames * 2 > frames
      reset()
      return poor
    },
  }
}
