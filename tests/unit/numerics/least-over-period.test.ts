import { describe, expect, it } from 'vitest'
import { leastOverPeriod } from '@/lib/numerics/least-over-period'

const TURN = 2 * Math.PI

describe('leastOverPeriod(f, period)', () => {
  it.each([0, 0.001, 1, 3.3, TURN - 1e-4])('finds the least of a cosine shifted to %d', (at) => {
    const least = leastOverPeriod((x) => -Math.cos(x - at), TURN)
    expect(least.value).toBeCloseTo(-1, 14)
    expect(Math.abs(Math.sin(least.at - at))).toBeLessThan(1e-6)
    expect(least.at).toBeGreaterThanOrEqual(0)
    expect(least.at).toBeLessThan(TURN)
  })

  it('finds a kink as exactly as a smooth least', () => {
    const least = leastOverPeriod((x) => Math.abs(Math.sin((x - 2.345) / 2)), TURN)
    expect(least.at).toBeCloseTo(2.345, 9)
  })

  it('takes the lower of two dips, however close their depths are', () => {
    const f = (x: number) => Math.cos(2 * x) - 1e-6 * Math.cos(x - Math.PI / 2)
    expect(leastOverPeriod(f, TURN).at).toBeCloseTo(Math.PI / 2, 5)
  })

  it('answers the beginning of the period for a constant', () => {
    expect(leastOverPeriod(() => 3, TURN)).toEqual({ at: 0, value: 3 })
  })
})
