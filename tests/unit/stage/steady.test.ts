import { describe, expect, it } from 'vitest'
import { createClock } from '@/scene/session/clock'
import { steady } from '@/scene/stage/steady'

describe('steady(clock, events)', () => {
  const events = Array.from({ length: 8 }, (_, cylinder) => ({ cylinder, angle: cylinder }))
  const clock = createClock(4 * Math.PI)

  it('holds the marks steady when more than three firings a second would be shown', () => {
    clock.setRate((3.1 * clock.cycle) / 8)
    clock.play()
    expect(steady(clock, events)).toBe(true)
    clock.setRate((2.9 * clock.cycle) / 8)
    expect(steady(clock, events)).toBe(false)
  })

  it('an engine that stands shows what fires', () => {
    clock.setRate(1000)
    clock.pause()
    expect(steady(clock, events)).toBe(false)
  })
})
