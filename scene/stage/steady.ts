import type { Clock } from '@/scene/session/clock'
import type { StageModel } from './types'

/** Changes a second that the eye may be shown. */
const mostFlashes = 3

/** At the shown clock the firings would flash: they are drawn steadily instead. */
export const steady = (clock: Clock, events: StageModel['events']): boolean =>
  clock.playing && (events.length * clock.rate) / clock.cycle > mostFlashes
