import { describe, expect, it } from 'vitest'
import {
  bottomDeadCentre,
  bottomHeight,
  pistonAcceleration,
  pistonPosition,
  pistonVelocity,
  rodAngle,
  topDeadCentre,
  topHeight,
} from '@/lib/mechanics/slider-crank'

const cranks: [number, number, number][] = [
  [0.05, 0.15, 0],
  [0.0438, 0.1465, 0.008],
  [0.0438, 0.1465, -0.008],
  [0.05, 0.1001, 0.02],
]

describe.each(cranks)('a crank of r = %f, l = %f, e = %f', (r, l, e) => {
  it('pistonPosition(α): the piston pin is one rod length from the crank pin, at e beside the crank', () => {
    for (let alpha = -7; alpha < 7; alpha += 0.31) {
      const s = pistonPosition(alpha, r, l, e)
      expect(Math.hypot(s - r * Math.cos(alpha), e - r * Math.sin(alpha))).toBeCloseTo(l, 14)
      expect(Math.sin(rodAngle(alpha, r, l, e)) * l).toBeCloseTo(r * Math.sin(alpha) - e, 14)
    }
  })

  it('pistonVelocity(α) and pistonAcceleration(α) are the slopes of position and velocity', () => {
    const h = 1e-5
    for (let alpha = 0; alpha < 6.28; alpha += 0.29) {
      const at = (f: typeof pistonPosition, x: number) => f(x, r, l, e)
      const slope = (f: typeof pistonPosition) => (at(f, alpha + h) - at(f, alpha - h)) / (2 * h)
      expect(pistonVelocity(alpha, r, l, e)).toBeCloseTo(slope(pistonPosition), 8)
      expect(pistonAcceleration(alpha, r, l, e)).toBeCloseTo(slope(pistonVelocity), 7)
    }
  })

  it('topDeadCentre and bottomDeadCentre: the piston stands still, at topHeight and bottomHeight', () => {
    const [top, bottom] = [topDeadCentre(r, l, e), bottomDeadCentre(r, l, e)]
    expect(pistonVelocity(top, r, l, e)).toBeCloseTo(0, 14)
    expect(pistonVelocity(bottom, r, l, e)).toBeCloseTo(0, 14)
    expect(pistonPosition(top, r, l, e)).toBeCloseTo(topHeight(r, l, e), 14)
    expect(pistonPosition(bottom, r, l, e)).toBeCloseTo(bottomHeight(r, l, e), 14)
    expect(pistonAcceleration(top, r, l, e)).toBeLessThan(0)
    expect(pistonAcceleration(bottom, r, l, e)).toBeGreaterThan(0)
  })
})

it('pistonAcceleration with λ above a quarter is greatest inward before bottom dead centre', () => {
  // common practice: with λ = 0.30 the least is −0.709 of r at 148°, not −0.700 at 180°
  const at = (alpha: number) => pistonAcceleration(alpha, 1, 1 / 0.3, 0)
  const angles = Array.from({ length: 1801 }, (_, k) => (k * Math.PI) / 1800)
  const greatest = angles.reduce((best, angle) => (at(angle) > at(best) ? angle : best))
  expect((greatest * 180) / Math.PI).toBeCloseTo(148, 0)
  expect(at(greatest)).toBeCloseTo(0.709, 3)
  expect(at(Math.PI)).toBeCloseTo(0.7, 12)
})
