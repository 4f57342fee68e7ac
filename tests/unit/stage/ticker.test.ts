import { describe, expect, it } from 'vitest'
import { createClock } from '@/scene/session/clock'
import { createTicker } from '@/scene/stage/ticker'

/** A page whose frames come when the test says so. */
function page() {
  const waiting = new Map<number, (now: number) => void>()
  let handle = 0
  let requests = 0
  const ticker = createTicker({
    request(callback) {
      requests++
      waiting.set(++handle, callback)
      return handle
    },
    cancel: (cancelled) => waiting.delete(cancelled),
  })
  const frame = (now: number) => {
    const due = [...waiting.values()]
    waiting.clear()
    for (const callback of due) callback(now)
  }
  return {
    ticker,
    frame,
    asleep: () => waiting.size === 0,
    waiting: () => waiting.size,
    requests: () => requests,
  }
}

describe('createTicker(source)', () => {
  it('join() draws once, then sleeps while nothing asks', () => {
    const { ticker, frame, asleep } = page()
    let drawn = 0
    ticker.join(createClock(), () => {
      drawn++
      return false
    })
    frame(0)
    expect(drawn).toBe(1)
    expect(asleep()).toBe(true)
  })

  it('keeps one animation frame for any number of stages', () => {
    const { ticker, waiting } = page()
    const clock = createClock()
    for (let i = 0; i < 5; i++) ticker.join(clock, () => true)
    expect(waiting()).toBe(1)
  })

  it('advances a clock that three stages share once a frame', () => {
    const { ticker, frame } = page()
    const clock = createClock()
    for (let i = 0; i < 3; i++) ticker.join(clock, () => false)
    clock.setRate(2)
    clock.play()
    frame(1000)
    frame(1050)
    expect(clock.angle).toBeCloseTo(2 * 0.05, 12)
  })

  it('frames go on while a clock runs, and end when it pauses', () => {
    const { ticker, frame, asleep } = page()
    const clock = createClock()
    ticker.join(clock, () => false)
    clock.setRate(1)
    clock.play()
    frame(0)
    frame(16)
    expect(asleep()).toBe(false)
    clock.pause()
    frame(32)
    expect(asleep()).toBe(true)
  })

  it('wake() draws only the stage that asked', () => {
    const { ticker, frame } = page()
    const clock = createClock()
    const drawn = [0, 0]
    const seats = drawn.map((_, i) =>
      ticker.join(clock, () => {
        drawn[i]++
        return false
      }),
    )
    frame(0)
    seats[1].wake()
    frame(16)
    expect(drawn).toEqual([1, 2])
  })

  it('a stage woken by a neighbour after its own turn is drawn in the next frame', () => {
    const { ticker, frame, asleep } = page()
    let drawn = 0
    const first = ticker.join(createClock(), () => {
      drawn++
      return false
    })
    ticker.join(createClock(), () => {
      if (drawn === 1) first.wake()
      return false
    })
    frame(0)
    expect(asleep()).toBe(false)
    frame(16)
    expect(drawn).toBe(2)
    expect(asleep()).toBe(true)
  })

  it('a tab that was away for a minute moves the crank by a tenth of a second at most', () => {
    const { ticker, frame } = page()
    const clock = createClock()
    ticker.join(clock, () => false)
    clock.setRate(1)
    clock.play()
    frame(0)
    frame(60_000)
    expect(clock.angle).toBeCloseTo(0.1, 12)
  })

  it('the first frame after sleep counts no time', () => {
    const { ticker, frame } = page()
    const elapsed: number[] = []
    const seat = ticker.join(createClock(), (_now, seconds) => {
      elapsed.push(seconds)
      return false
    })
    frame(0)
    seat.wake()
    frame(5000)
    expect(elapsed).toEqual([0, 0])
  })

  it('leave() of the last stage cancels the frame that was asked for, and wake() after it asks for none', () => {
    const { ticker, asleep } = page()
    const seat = ticker.join(createClock(), () => true)
    seat.leave()
    expect(asleep()).toBe(true)
    seat.wake()
    expect(asleep()).toBe(true)
  })

  it('a stage may leave in the middle of a frame without costing a neighbour its turn', () => {
    const { ticker, frame } = page()
    const clock = createClock()
    const drawn: string[] = []
    const seat = ticker.join(clock, () => {
      drawn.push('first')
      seat.leave()
      return false
    })
    ticker.join(clock, () => {
      drawn.push('second')
      return false
    })
    frame(0)
    expect(drawn).toEqual(['first', 'second'])
  })
})
