import { describe, expect, it } from 'vitest'
import { createClock } from '@/scene/session/clock'
import { burning, steady } from '@/scene/stage/burning'

const degree = Math.PI / 180

describe('burning(event, angle, cycle, burn)', () => {
  it('from the event for 60° where nothing else is known, also across the end of the cycle', () => {
    const cycle = 4 * Math.PI
    expect(burning(90 * degree, 89 * degree, cycle)).toBe(false)
    expect(burning(90 * degree, 91 * degree, cycle)).toBe(true)
    expect(burning(90 * degree, 149 * degree, cycle)).toBe(true)
    expect(burning(90 * degree, 151 * degree, cycle)).toBe(false)
    expect(burning(700 * degree, 20 * degree, cycle)).toBe(true)
  })

  it('in the window of a heat-release model otherwise', () => {
    const burn = { from: -10 * degree, to: 50 * degree }
    expect(burning(0, 715 * degree, 4 * Math.PI, burn)).toBe(true)
    expect(burning(0, 55 * degree, 4 * Math.PI, burn)).toBe(false)
  })
})

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
