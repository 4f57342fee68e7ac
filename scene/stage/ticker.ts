import type { Clock } from '@/scene/session/clock'

/** The one animation frame of a page: it advances every clock once, lets every stage draw, and sleeps when none asks. */
export interface Ticker {
  join(clock: Clock, tick: Tick): Seat
}

/** Called once a frame while awake; true asks for another frame. `seconds` is the time since the last frame, 0 after sleep. */
export type Tick = (now: number, seconds: number) => boolean

export interface Seat {
  wake(): void
  leave(): void
}

export interface FrameSource {
  request(callback: (now: number) => void): number
  cancel(handle: number): void
}

/** A tab that comes back must not throw the crank round by the minutes it was away. */
const longestStep = 0.1

interface Member {
  clock: Clock
  tick: Tick
  awake: boolean
}

export function createTicker(source: FrameSource): Ticker {
  let members: Member[] = []
  let clocks: Clock[] = []
  let handle = 0
  let asked = false
  let last = -1

  const ask = () => {
    if (asked) return
    asked = true
    handle = source.request(frame)
  }

  function frame(now: number) {
    asked = false
    const elapsed = last < 0 ? 0 : Math.max(0, (now - last) / 1000)
    last = now
    let more = false
    for (let i = 0; i < clocks.length; i++) {
      const clock = clocks[i]
      clock.advance(Math.min(elapsed, longestStep))
      if (clock.playing && clock.rate !== 0) more = true
    }
    const present = members
    for (let i = 0; i < present.length; i++) {
      const member = present[i]
      if (!member.awake) continue
      member.awake = false
      if (member.tick(now, elapsed)) member.awake = true
    }
    // A tick may wake a neighbour that had its turn already.
    for (let i = 0; i < members.length; i++) if (members[i].awake) more = true
    if (more) ask()
    else if (!asked) last = -1
  }

  return {
    join(clock, tick) {
      const member: Member = { clock, tick, awake: true }
      members = [...members, member]
      if (!clocks.includes(clock)) clocks = [...clocks, clock]
      ask()
      return {
        wake() {
          if (!members.includes(member)) return
          member.awake = true
          ask()
        },
        leave() {
          members = members.filter((other) => other !== member)
          if (!members.some((other) => other.clock === clock))
            clocks = clocks.filter((other) => other !== clock)
          if (members.length > 0 || !asked) return
          source.cancel(handle)
          asked = false
          last = -1
        },
      }
    },
  }
}

let shared: Ticker | null = null

export const pageTicker = (): Ticker =>
  (shared ??= createTicker({
    request: (callback) => requestAnimationFrame(callback),
    cancel: (handle) => cancelAnimationFrame(handle),
  }))
