import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bobWeights } from '@/lib/mechanics/balance'
import { orderStar } from '@/lib/mechanics/loads/torque-orders'
import { buildPlan } from '@/lib/mechanics/plan'
import {
  criticalSpeeds,
  modeVectorSum,
  runningRange,
  usualOrders,
} from '@/lib/mechanics/torsion/critical-speeds'
import { holzer } from '@/lib/mechanics/torsion/holzer'
import { nodesOf, rayleighFrequency, shaftModes } from '@/lib/mechanics/torsion/shaft-modes'
import { equivalentLength, polarMoment, shaftStiffness } from '@/lib/mechanics/torsion/shaft-stiffness'
import { throwInertias } from '@/lib/mechanics/torsion/throw-inertia'
import { kerWilsonStiffness, throwStiffness, type ThrowSizes } from '@/lib/mechanics/torsion/throw-stiffness'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset } from '@/tests/support/mechanics/presets'

const figure = fc.double({ min: 1e-2, max: 1e2, noNaN: true })
const chainOf = (each: fc.Arbitrary<number>) =>
  fc.integer({ min: 2, max: 9 }).chain((count) =>
    fc.record({
      inertias: fc.array(each, { minLength: count, maxLength: count }),
      stiffnesses: fc.array(
        each.map((k) => 1e5 * k),
        { minLength: count - 1, maxLength: count - 1 },
      ),
    }),
  )

describe('shaftModes(chain)', () => {
  // D-13: f = √(k(I₁ + I₂)/(I₁·I₂))/2π within 0.01 %
  it('of two inertias is the closed form within 1e-12', () => {
    fc.assert(
      fc.property(figure, figure, figure, (a, b, k) => {
        const [{ frequency }] = shaftModes({ inertias: [a, b], stiffnesses: [1e5 * k] })
        expect(frequency / Math.sqrt((1e5 * k * (a + b)) / (a * b)) - 1).toBeCloseTo(0, 12)
      }),
    )
  })

  // ω⁴ − ω²(k₁(1/I₁ + 1/I₂) + k₂(1/I₂ + 1/I₃)) + k₁k₂(I₁ + I₂ + I₃)/(I₁I₂I₃) = 0, the determinant written out
  it('of three inertias is the root of the frequency equation', () => {
    fc.assert(
      fc.property(figure, figure, figure, figure, figure, (a, b, c, k, l) => {
        const half = (k * (1 / a + 1 / b) + l * (1 / b + 1 / c)) / 2
        const last = (k * l * (a + b + c)) / (a * b * c)
        const high = half + Math.sqrt(half ** 2 - last)
        const modes = shaftModes({ inertias: [a, b, c], stiffnesses: [k, l] })
        expect(modes[1].frequency ** 2 / high).toBeCloseTo(1, 9)
        expect(modes[0].frequency ** 2 / (last / high)).toBeCloseTo(1, 9)
      }),
    )
  })

  // of inertias alike enough that no two frequencies fall together
  it('finds each frequency where the torque left over in Holzer’s table changes its sign, within 1e-6', () => {
    fc.assert(
      fc.property(chainOf(fc.double({ min: 0.5, max: 5, noNaN: true })), (of) => {
        for (const { frequency } of shaftModes(of)) {
          const [below, above] = [1 - 1e-6, 1 + 1e-6].map((share) => holzer(of, share * frequency).residual)
          expect(below * above).toBeLessThan(0)
        }
      }),
    )
  })

  it('leaves torque over in Holzer’s table beside a frequency, of another sign on either side', () => {
    const of = { inertias: [8, 6, 4], stiffnesses: [4e6, 2e6] }
    for (const { frequency } of shaftModes(of)) {
      const [below, above] = [0.99, 1.01].map((share) => holzer(of, share * frequency).residual)
      expect(below * above).toBeLessThan(0)
      expect(Math.min(Math.abs(below), Math.abs(above))).toBeGreaterThan(1e4)
    }
  })

  it('has one more node in each mode, shapes without momentum, and none with a share in another', () => {
    fc.assert(
      fc.property(chainOf(figure), (of) => {
        const modes = shaftModes(of)
        expect(modes).toHaveLength(of.inertias.length - 1)
        const shared = (a: number[], b: number[]) =>
          of.inertias.reduce((sum, inertia, i) => sum + inertia * a[i] * b[i], 0)
        const apart = (a: number[], b: number[]) =>
          expect(Math.abs(shared(a, b)) / Math.sqrt(shared(a, a) * shared(b, b))).toBeLessThan(1e-7)
        modes.forEach(({ frequency, shape }, n) => {
          expect(Math.max(...shape.map(Math.abs))).toBeCloseTo(1, 12)
          expect(shape[0]).toBeGreaterThanOrEqual(0)
          expect(rayleighFrequency(of, shape) / frequency).toBeCloseTo(1, 9)
          const rigid = shape.map(() => 1)
          for (const other of [rigid, ...modes.slice(0, n).map((mode) => mode.shape)]) apart(shape, other)
        })
      }),
    )
    const even = { inertias: new Array<number>(6).fill(2), stiffnesses: new Array<number>(5).fill(3e5) }
    expect(shaftModes(even).map(({ shape }) => nodesOf(shape))).toEqual([1, 2, 3, 4, 5])
  })

  // equal discs on equal shafts: ω = 2√(k/I)·sin(jπ/2n) (vibration textbooks)
  it.each([2, 4, 9])('of %i equal discs is the closed form', (count) => {
    const modes = shaftModes({
      inertias: new Array<number>(count).fill(0.3),
      stiffnesses: new Array<number>(count - 1).fill(2e5),
    })
    modes.forEach(({ frequency }, i) =>
      expect(
        frequency / (2 * Math.sqrt(2e5 / 0.3) * Math.sin(((i + 1) * Math.PI) / (2 * count))),
      ).toBeCloseTo(1, 12),
    )
  })

  it.each([
    { inertias: [1], stiffnesses: [] },
    { inertias: [1, 2], stiffnesses: [1, 2] },
    { inertias: [1, 0], stiffnesses: [1] },
    { inertias: [1, 2], stiffnesses: [-1] },
    { inertias: [1, Number.NaN], stiffnesses: [1] },
  ])('refuses %j', (of) => {
    expect(() => shaftModes(of)).toThrow(RangeError)
  })
})

describe('stiffness of shafts and throws', () => {
  it('a shaft in two lengths is softer in series, and as stiff as its equivalent length of one diameter', () => {
    const lengths = [
      { length: 0.2, outer: 0.05 },
      { length: 0.1, outer: 0.08, inner: 0.03 },
    ]
    const [a, b] = lengths.map((one) => shaftStiffness([one], 8e10))
    expect(a).toBeCloseTo((8e10 * Math.PI * 0.05 ** 4) / 32 / 0.2, 3)
    const both = shaftStiffness(lengths, 8e10)
    expect(1 / both).toBeCloseTo(1 / a + 1 / b, 18)
    expect((8e10 * polarMoment(0.06)) / equivalentLength(lengths, 0.06) / both).toBeCloseTo(1, 12)
  })

  const sizes: ThrowSizes = {
    mainDia: 0.06,
    mainBore: 0,
    mainLength: 0.03,
    pinDia: 0.05,
    pinBore: 0.02,
    pinLength: 0.028,
    webThickness: 0.02,
    webWidth: 0.09,
    radius: 0.045,
  }
  // Carter’s formula worked by hand, from memory as the formula itself
  it('throwStiffness is Carter’s formula, with its equivalent length at the diameter of the main', () => {
    const length =
      0.06 ** 4 *
      ((0.03 + 0.8 * 0.02) / 0.06 ** 4 +
        (0.75 * 0.028) / (0.05 ** 4 - 0.02 ** 4) +
        (1.5 * 0.045) / (0.02 * 0.09 ** 3))
    expect(throwStiffness(sizes, 79e9) / ((79e9 * polarMoment(0.06)) / length)).toBeCloseTo(1, 12)
  })
  it('kerWilsonStiffness is of the same size, and null where pin and main overlap too far', () => {
    const length =
      0.06 ** 4 *
      ((0.03 + 0.4 * 0.06) / 0.06 ** 4 +
        (0.028 + 0.4 * 0.05) / (0.05 ** 4 - 0.02 ** 4) +
        (0.045 - 0.2 * 0.11) / (0.02 * 0.09 ** 3))
    const stiffness = kerWilsonStiffness(sizes, 79e9)!
    expect(stiffness / ((79e9 * polarMoment(0.06)) / length)).toBeCloseTo(1, 12)
    expect(Math.abs(stiffness / throwStiffness(sizes, 79e9) - 1)).toBeLessThan(0.3)
    expect(kerWilsonStiffness({ ...sizes, radius: 0.02 }, 79e9)).toBeNull()
  })
})

describe('throwInertias(train, crank)', () => {
  it('adds what turns and half of what goes to and fro to the crank’s own', () => {
    const train = trainOf(preset('v8x-5000'))
    const { radius } = train.throws[0]
    const { rotating, reciprocating } = bobWeights(train)[0]
    const crank = train.throws.map((_, i) => 0.001 * (i + 1))
    throwInertias(train, crank).forEach((inertia, i) =>
      expect(inertia).toBeCloseTo(crank[i] + (rotating + reciprocating / 2) * radius ** 2, 12),
    )
  })
})

describe('critical speeds', () => {
  it('criticalSpeeds are ω/N, told to be inside, near or outside the running range', () => {
    const found = criticalSpeeds([100, 300], [1, 2], { from: 60, to: 140 })
    expect(found.map(({ order, mode, speed, place }) => [order, mode, speed, place])).toEqual([
      [1, 0, 100, 'inside'],
      [1, 1, 300, 'outside'],
      [2, 0, 50, 'outside'],
      [2, 1, 150, 'near'],
    ])
    expect(criticalSpeeds([51], [1], { from: 60, to: 140 })[0].place).toBe('near')
    expect(criticalSpeeds([51], [1], null)[0].place).toBeNull()
  })
  it('runningRange goes from idle to the maximum, or the rated speed, and is not guessed without them', () => {
    const train = trainOf(preset('i4-2000'))
    const range = (operating: typeof train.operating) => runningRange({ ...train, operating })
    expect(range({ idle: 80, rated: 600, max: 700 })).toEqual({ from: 80, to: 700 })
    expect(range({ rated: 600 })).toEqual({ from: 0, to: 600 })
    expect(range({ idle: 80 })).toBeNull()
  })
  it('usualOrders are half ones of a four-stroke and whole ones of a two-stroke', () => {
    expect(usualOrders(trainOf(preset('i4-2000'))).slice(0, 3)).toEqual([0.5, 1, 1.5])
    const two = usualOrders(trainOf(preset('single-125-2t')))
    expect([two[0], two.length]).toEqual([1, 12])
  })
  it('modeVectorSum of a shape that does not twist is the plain sum of phase vectors', () => {
    const train = trainOf(preset('i6-3000'))
    const { fires } = buildPlan(train, 0)
    const stationOf = train.cylinders.map((cylinder) => 1 + cylinder.throw)
    for (const order of usualOrders(train)) {
      const { sum } = orderStar(fires, order)
      const rigid = { frequency: 0, shape: new Array<number>(8).fill(1) }
      expect(modeVectorSum(fires, order, rigid, stationOf)).toBeCloseTo(Math.hypot(sum.re, sum.im), 12)
    }
    // at a major order every vector points the same way: the sum is of the shape’s angles alone
    const shape = [1, 0.9, 0.7, 0.5, 0.2, -0.1, -0.3, -0.6]
    const inPhase = Math.abs(0.9 + 0.7 + 0.5 + 0.2 - 0.1 - 0.3)
    expect(modeVectorSum(fires, 3, { frequency: 1, shape }, stationOf)).toBeCloseTo(inPhase, 12)
  })
})
