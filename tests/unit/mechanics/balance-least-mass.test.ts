import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { leastMass, type MassPlane } from '@/lib/mechanics/balance/least-mass'
import { minus, phasor, plus, scaled } from '@/lib/mechanics/balance/phasor'
import type { Complex } from '@/lib/numerics/fourier'

const zero = { re: 0, im: 0 }
const size = (c: Complex) => phasor(c).size
const total = (masses: Complex[]) => masses.reduce((sum, mass) => sum + size(mass), 0)

function leftOf(planes: MassPlane[], masses: Complex[], force: Complex, couple: Complex) {
  return planes.reduce(
    ([f, c], { radius, place }, i) => [
      minus(f, scaled(masses[i], radius)),
      minus(c, scaled(masses[i], radius * place)),
    ],
    [force, couple],
  )
}

/** The one answer of two planes at different places. */
function pairMass(a: MassPlane, b: MassPlane, force: Complex, couple: Complex) {
  const atB = scaled(minus(couple, scaled(force, a.place)), 1 / (b.place - a.place))
  const atA = minus(force, atB)
  return size(atA) / a.radius + size(atB) / b.radius
}

const part = fc.integer({ min: -1000, max: 1000 }).map((value) => value / 1000)
const vector = fc.record({ re: part, im: part })
const planesOf = (least: number) =>
  fc
    .uniqueArray(fc.integer({ min: -20, max: 20 }), { minLength: least, maxLength: 14 })
    .chain((places) =>
      fc
        .array(fc.integer({ min: 20, max: 90 }), { minLength: places.length, maxLength: places.length })
        .map((radii) =>
          places.map((place, i): MassPlane => ({ place: place / 80, radius: radii[i] / 1000 })),
        ),
    )

describe('leastMass(planes, force, couple)', () => {
  it('balances to rounding, and is no heavier than its own lower bound', () => {
    fc.assert(
      fc.property(planesOf(2), vector, vector, (planes, force, couple) => {
        const { masses, bound, balances } = leastMass(planes, force, couple)
        expect(balances).toBe(true)
        const [f, c] = leftOf(planes, masses, force, couple)
        const whole = size(force) + size(couple)
        expect(size(f)).toBeLessThanOrEqual(1e-13 * whole)
        expect(size(c)).toBeLessThanOrEqual(1e-13 * whole)
        expect(total(masses) - bound).toBeLessThanOrEqual(1e-9 * bound)
        expect(total(masses) - bound).toBeGreaterThanOrEqual(-1e-12 * bound)
      }),
      { numRuns: 400, seed: 7 },
    )
  })

  it('is no heavier than the best pair of planes', () => {
    fc.assert(
      fc.property(planesOf(2), vector, vector, (planes, force, couple) => {
        const pairs = planes.flatMap((a, i) => planes.slice(i + 1).map((b) => pairMass(a, b, force, couple)))
        const best = Math.min(...pairs)
        expect(total(leastMass(planes, force, couple).masses)).toBeLessThanOrEqual(best * (1 + 1e-9))
      }),
      { numRuns: 200, seed: 11 },
    )
  })

  it('is no heavier than what any shift of weight along the crank makes of it', () => {
    const shift = fc.tuple(fc.nat(13), fc.nat(13), fc.nat(13), vector, fc.integer({ min: -6, max: 0 }))
    fc.assert(
      fc.property(
        planesOf(3),
        vector,
        vector,
        fc.array(shift, { minLength: 20, maxLength: 20 }),
        (...given) => {
          const [planes, force, couple, shifts] = given
          const { masses } = leastMass(planes, force, couple)
          for (const [i, j, k, by, power] of shifts) {
            const [a, b, c] = [i, j, k].map((index) => index % planes.length)
            if (new Set([a, b, c]).size < 3) continue
            // three moments that make neither force nor couple
            const [za, zb, zc] = [a, b, c].map((index) => planes[index].place)
            const shares = [zb - zc, zc - za, za - zb]
            const moved = [...masses]
            ;[a, b, c].forEach((index, n) => {
              const change = scaled(by, (10 ** power * shares[n]) / planes[index].radius)
              moved[index] = plus(moved[index], change)
            })
            const [f, m] = leftOf(planes, moved, force, couple)
            expect(size(f) + size(m)).toBeLessThan(1e-11)
            expect(total(moved)).toBeGreaterThanOrEqual(total(masses) * (1 - 1e-9))
          }
        },
      ),
      { numRuns: 100, seed: 13 },
    )
  })

  it('settles ties by the least sum of squares: a force in the middle of equal planes is shared evenly', () => {
    const planes = [-3, -1, 1, 3].map((place): MassPlane => ({ place: place / 10, radius: 0.05 }))
    const { masses } = leastMass(planes, { re: 0.3, im: 0.4 }, zero)
    for (const mass of masses)
      expect(mass).toEqual({ re: expect.closeTo(1.5, 12), im: expect.closeTo(2, 12) })
  })

  it('answers a couple at the two ends, where it has the longest arm', () => {
    const planes = [-3, -1, 1, 3].map((place): MassPlane => ({ place: place / 10, radius: 0.05 }))
    const { masses, bound } = leastMass(planes, zero, { re: 0.06, im: 0 })
    expect(masses.map(({ re }) => Number(re.toFixed(12)))).toEqual([-2, 0, 0, 2])
    expect(bound).toBeCloseTo(4, 12)
  })

  it('keeps to what a plane may hold, and still shows that nothing lighter would do', () => {
    fc.assert(
      fc.property(planesOf(4), vector, vector, fc.double({ min: 1.02, max: 3, noNaN: true }), (...given) => {
        const [planes, force, couple, slack] = given
        // a limit that some choice surely keeps: what an even spread needs in its heaviest plane, and a little more
        fc.pre(size(force) + size(couple) > 0)
        const spreadOut = Math.max(
          ...leastSquares(planes, force, couple).map((moment, i) => size(moment) / planes[i].radius),
        )
        const limited = planes.map((plane) => ({ ...plane, most: slack * spreadOut }))
        const { masses, bound, balances } = leastMass(limited, force, couple)
        expect(balances).toBe(true)
        for (const mass of masses) expect(size(mass)).toBeLessThanOrEqual(slack * spreadOut * (1 + 1e-9))
        const [f, c] = leftOf(planes, masses, force, couple)
        expect(size(f) + size(c)).toBeLessThanOrEqual(1e-12)
        // limits make the last steps slow: shown to a hundred-thousandth
        expect(total(masses) - bound).toBeLessThanOrEqual(1e-5 * total(masses))
      }),
      { numRuns: 200, seed: 17 },
    )
  })

  it('says so where no choice balances: a couple at one place, and planes that are full', () => {
    const one: MassPlane = { place: 0.1, radius: 0.05 }
    expect(leastMass([one, one], { re: 1, im: 0 }, { re: 0.1, im: 0 }).balances).toBe(true)
    expect(leastMass([one, one], { re: 1, im: 0 }, { re: 0.2, im: 0 }).balances).toBe(false)
    const full = [-0.1, 0.1].map((place): MassPlane => ({ place, radius: 0.05, most: 1 }))
    expect(leastMass(full, { re: 0.0999, im: 0 }, zero).balances).toBe(true)
    expect(leastMass(full, { re: 0.11, im: 0 }, zero).balances).toBe(false)
  })
})

/** The least squares of moments, by its normal equations. */
function leastSquares(planes: MassPlane[], force: Complex, couple: Complex): Complex[] {
  const [n, s1, s2] = [0, 1, 2].map((power) => planes.reduce((sum, { place }) => sum + place ** power, 0))
  const det = n * s2 - s1 * s1
  const at = scaled(minus(scaled(force, s2), scaled(couple, s1)), 1 / det)
  const slope = scaled(minus(scaled(couple, n), scaled(force, s1)), 1 / det)
  return planes.map(({ place }) => plus(at, scaled(slope, place)))
}
