'use client'

import { useSyncExternalStore } from 'react'
import { Icon } from '@/components/ui/icon'
import type { Clock } from '@/scene/session/clock'
import { stepClock } from './clock-moves'

const step = (clock: Clock, by: 1 | -1) => (
  <button
    type="button"
    className="btn ic"
    aria-label={by < 0 ? 'Back 1 degree' : 'On 1 degree'}
    onClick={() => stepClock(clock, by)}
  >
    <Icon name={by < 0 ? 'back' : 'on'} />
  </button>
)

/** Runs and steps a clock; where motion is not wanted, only steps. */
export function PlayButtons({ clock, still = false }: { clock: Clock; still?: boolean }) {
  const playing = useSyncExternalStore(
    clock.subscribe,
    () => clock.playing,
    () => false,
  )
  return (
    <div className="btns">
      {still ? null : (
        <button
          type="button"
          className="btn pri ic"
          aria-label={playing ? 'Pause' : 'Play'}
          onClick={() => (playing ? clock.pause() : clock.play())}
        >
          <Icon name={playing ? 'pause' : 'play'} />
        </button>
      )}
      {step(clock, -1)}
      {step(clock, 1)}
    </div>
  )
}
