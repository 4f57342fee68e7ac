/**
 * The crank angle, kept outside React and outside the document. The stage's one animation frame advances it;
 * everything on the page that shows an angle reads it from here.
 */
export interface Clock {
  /** Crank angle, rad, in 0 … cycle. */
  readonly angle: number
  readonly cycle: number
  readonly playing: boolean
  /** Shown speed of the crank, rad/s (already slowed). */
  readonly rate: number
  readonly reverse: boolean
  setAngle(angle: number): void
  setCycle(cycle: number): void
  setRate(rate: number): void
  setReverse(reverse: boolean): void
  play(): void
  pause(): void
  /** Moves the angle by the elapsed seconds when playing; true when it moved. */
  advance(seconds: number): boolean
  /** Called after any change, at most once a call; a listener must not change the clock. */
  subscribe(listener: () => void): () => void
}

const wrap = (angle: number, cycle: number) => {
  const rest = angle % cycle
  return rest < 0 ? rest + cycle : rest
}

export function createClock(cycle = 4 * Math.PI): Clock {
  const listeners = new Set<() => void>()
  const notify = () => {
    for (const listener of listeners) listener()
  }
  const state = { angle: 0, cycle, playing: false, rate: 0, reverse: false }
  const change = <K extends keyof typeof state>(key: K, value: (typeof state)[K]) => {
    if (state[key] === value) return
    state[key] = value
    notify()
  }
  return {
    get angle() {
      return state.angle
    },
    get cycle() {
      return state.cycle
    },
    get playing() {
      return state.playing
    },
    get rate() {
      return state.rate
    },
    get reverse() {
      return state.reverse
    },
    setAngle: (angle) => change('angle', wrap(angle, state.cycle)),
    setCycle(next) {
      if (next === state.cycle) return
      state.cycle = next
      state.angle = wrap(state.angle, next)
      notify()
    },
    setRate: (rate) => change('rate', rate),
    setReverse: (reverse) => change('reverse', reverse),
    play: () => change('playing', true),
    pause: () => change('playing', false),
    advance(seconds) {
      if (!state.playing || state.rate === 0) return false
      const step = state.rate * seconds
      state.angle = wrap(state.angle + (state.reverse ? -step : step), state.cycle)
      notify()
      return true
    },
    subscribe(listener) {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
  }
}
