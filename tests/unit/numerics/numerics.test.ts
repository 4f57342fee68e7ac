import { describe, expect, it } from 'vitest'
import { bracketedRoot } from '@/lib/numerics/bracketed-root'
import { fourierCoefficient, unitCircle } from '@/lib/numerics/fourier'
import { gaussLegendre } from '@/lib/numerics/gauss-legendre'
import { wrap, wrapCentred } from '@/lib/numerics/wrap'

describe('wrap(angle, period)', () => {
  it('brings any angle into 0 ≤ x < period', () => {
    expect(wrap(7, 3)).toBe(1)
    expect(wrap(-1, 3)).toBe(2)
    expect(wrap(0, 3)).toBe(0)
    expect(wrap(3, 3)).toBe(0)
  })

  it('takes an angle a rounding error below the period for 0', () => {
    expect(wrap(-1e-16, 2 * Math.PI)).toBe(0)
    expect(wrap(2 * Math.PI - 1e-12, 2 * Math.PI)).toBe(0)
    expect(wrap(2 * Math.PI - 1e-6, 2 * Math.PI)).toBeGreaterThan(6)
  })
})

describe('wrapCentred(angle, period)', () => {
  it('brings any angle into −period/2 ≤ x < period/2', () => {
    expect(wrapCentred(5, 4)).toBe(1)
    expect(wrapCentred(2, 4)).toBe(-2)
    expect(wrapCentred(2 - 1e-12, 4)).toBe(-2)
  })
})

describe('bracketedRoot(f, a, b)', () => {
  it.each([
    ['cos x', Math.cos, 0, 3, Math.PI / 2],
    ['x³ − 2', (x: number) => x ** 3 - 2, 0, 100, Math.cbrt(2)],
    ['e^x − 1000', (x: number) => Math.exp(x) - 1000, -50, 50, Math.log(1000)],
    ['a step', (x: number) => (x < 0.25 ? -1 : 1), -1, 1, 0.25],
  ])('finds the root of %s to the last bits', (_, f, a, b, root) => {
    expect(bracketedRoot(f, a, b)).toBeCloseTo(root, 14)
    expect(bracketedRoot(f, b, a)).toBeCloseTo(root, 14)
  })

  it('returns an end that is the root', () => {
    expect(bracketedRoot((x) => x, 0, 1)).toBe(0)
  })

  it('throws where there is no change of sign', () => {
    expect(() => bracketedRoot((x) => x * x + 1, -1, 1)).toThrow(RangeError)
  })
})

describe('gaussLegendre(n)', () => {
  it.each([1, 2, 5, 8, 20])('of %i points is exact for polynomials up to degree 2n − 1', (n) => {
    const { nodes, weights } = gaussLegendre(n)
    for (let degree = 0; degree < 2 * n; degree++) {
      const sum = nodes.reduce((total, x, k) => total + weights[k] * x ** degree, 0)
      expect(sum).toBeCloseTo(degree % 2 === 0 ? 2 / (degree + 1) : 0, 13)
    }
  })
})

describe('fourierCoefficient(signal, bin, circle)', () => {
  it('finds amplitude and phase of a sum of cosines exactly', () => {
    const n = 720
    const signal = Array.from({ length: n }, (_, j) => {
      const angle = (2 * Math.PI * j) / n
      return 5 + 3 * Math.cos(2 * angle - 0.7) + 0.5 * Math.cos(24 * angle + 1)
    })
    const at = (bin: number) => fourierCoefficient(signal, bin, unitCircle(n))
    expect(at(0).re).toBeCloseTo(5, 13)
    expect(2 * Math.hypot(at(2).re, at(2).im)).toBeCloseTo(3, 13)
    expect(Math.atan2(-at(2).im, at(2).re)).toBeCloseTo(0.7, 13)
    expect(2 * Math.hypot(at(24).re, at(24).im)).toBeCloseTo(0.5, 13)
    expect(Math.hypot(at(3).re, at(3).im)).toBeLessThan(1e-14)
  })
})
