import type { Clock } from '@/scene/session/clock'
import type { Forces } from './types'

/** Changes a second that the eye may be shown. */
const mostFlashes = 3

/** At the shown clock the firings would flash: they are drawn steadily instead. */
export const steady = (clock: Clock, events: Forces['events']): boolean =>
  clock.playing && (events.length * clock.rate) / clock.cycle > mostFlashes
