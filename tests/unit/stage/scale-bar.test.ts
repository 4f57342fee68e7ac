import { assert, double, property } from 'fast-check'
import { describe, expect, it } from 'vitest'
import { scaleBar } from '@/scene/stage/scale-bar'

describe('scaleBar(pixelsPerNewton, unit)', () => {
  it('stands for 1, 2 or 5 times a power of ten, and is between two fifths and the whole of the room', () => {
    assert(
      property(double({ min: -8, max: 3, noNaN: true }), (exponent) => {
        for (const unit of ['N', 'lbf'] as const) {
          const bar = scaleBar(10 ** exponent, unit, 64)
          expect(bar.length).toBeLessThanOrEqual(64 * (1 + 1e-9))
          expect(bar.length).toBeGreaterThan(64 / 2.5 / (1 + 1e-9))
          expect(bar.length).toBeCloseTo(bar.force * 10 ** exponent, 6)
        }
      }),
    )
  })

  it('writes newtons as kN from a thousand on, pounds-force in full', () => {
    expect(scaleBar(60 / 10_000, 'N').label).toBe('10 kN')
    expect(scaleBar(60 / 500, 'N').label).toBe('500 N')
    expect(scaleBar(60 / (2000 * 4.4482216152605), 'lbf').label).toBe('2,000 lbf')
  })
})
