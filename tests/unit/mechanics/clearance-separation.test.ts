import { describe, expect, it } from 'vitest'
import { placed, separation } from '@/lib/mechanics/clearance/separation'
import type { Solid } from '@/lib/mechanics/clearance/sizes'

const solid = (points: number[], round = 0): Solid => ({ points: Float64Array.from(points), round })
const square = solid([-1, -1, 1, -1, 1, 1, -1, 1])
const moved = (x: number, y: number, turn = 0) => placed(square, Math.cos(turn), Math.sin(turn), x, y)

describe('separation(a, b)', () => {
  it('is the distance of two squares that face each other, and the depth where they overlap', () => {
    expect(separation(square, moved(5, 0.3))).toBeCloseTo(3, 14)
    expect(separation(square, moved(1.5, 0.3))).toBeCloseTo(-0.5, 14)
  })

  it('is never more than the true distance of two corners, and 0 where they touch', () => {
    expect(separation(square, moved(4, 4))).toBeLessThanOrEqual(Math.hypot(2, 2))
    expect(separation(square, moved(2, 2))).toBeCloseTo(0, 14)
  })

  it('is the same whichever way round, however both are turned and moved, and however the outline runs', () => {
    const other = moved(2.2, 1.1, 0.4)
    const apart = separation(square, other)
    expect(separation(other, square)).toBeCloseTo(apart, 14)
    const shift = (one: Solid) => placed(one, Math.cos(1.2), Math.sin(1.2), -7, 3)
    expect(separation(shift(square), shift(other))).toBeCloseTo(apart, 12)
    const backwards = solid([-1, 1, 1, 1, 1, -1, -1, -1])
    expect(separation(backwards, other)).toBeCloseTo(apart, 14)
  })

  it('takes what is rounded off: two circles, and a circle beside a square', () => {
    expect(separation(solid([0, 0], 1), solid([3, 4], 1.5))).toBeCloseTo(2.5, 14)
    expect(separation(square, solid([4, 0], 1))).toBeCloseTo(2, 14)
  })
})
