import type { Pacing } from './painter'

/** The page's or the worker's own clock and queue: messages and input are heard between two steps. */
export const pagePacing: Pacing = {
  now: () => performance.now(),
  soon: (step) => setTimeout(step, 0),
}
