import { describe, expect, it } from 'vitest'
import { residualUnbalance } from '@/lib/mechanics/balance'
import { halfDiscMoment, slugFor } from '@/lib/mechanics/balance/half-disc'
import { CannotBalance, solveCounterweights, type Plane } from '@/lib/mechanics/balance/solve-counterweights'
import { presets } from '@/scene/model/presets'
import { presentPlanes, webPlanes } from '@/scene/frame/web-planes'
import { DEG, inline, presetDocument, presetTrain, trainOf } from './trains'

const ids = presets.map(({ id }) => id)
const moments = (weights: { mass: number; radius: number }[]) =>
  weights.map(({ mass, radius }) => mass * radius)

function expectBalanced(
  train: ReturnType<typeof presetTrain>,
  counterweights: (typeof train)['counterweights'],
) {
  const { static: force, couple } = residualUnbalance({ ...train, counterweights })
  // 1e-5 kg mm and 1e-3 kg mm² are asked for; this is rounding of the throws themselves
  const scale = train.throws.length * train.cylinders[0].pistonMass * train.throws[0].radius
  expect(force.size).toBeLessThanOrEqual(1e-12 * scale)
  expect(couple.size).toBeLessThanOrEqual(1e-12 * scale)
}

describe('solveCounterweights(train, planes)', () => {
  it.each(ids)('%s is balanced in its own planes and in its bare webs, at the least mass', (id) => {
    const train = presetTrain(id)
    for (const planes of [presentPlanes(presetDocument(id), train), webPlanes(presetDocument(id), train)]) {
      const { counterweights, mass, least } = solveCounterweights(train, planes)
      expectBalanced(train, counterweights)
      expect(counterweights.map((weight) => weight.id)).toEqual(planes.map((plane) => plane.id))
      expect(mass - least).toBeLessThanOrEqual(1e-9 * mass)
    }
    // the file's weights balance too, to the milligram they are rounded to
    const filed = train.counterweights.reduce((sum, weight) => sum + weight.mass, 0)
    if (filed > 0)
      expect(solveCounterweights(train, presentPlanes(presetDocument(id), train)).mass).toBeLessThanOrEqual(
        filed * (1 + 1e-5),
      )
  })

  it.each(ids.filter((id) => presetTrain(id).counterweights.length > 0))(
    '%s by bays and evenly is balanced too, no lighter',
    (id) => {
      const train = presetTrain(id)
      const planes = presentPlanes(presetDocument(id), train)
      const { mass } = solveCounterweights(train, planes)
      for (const rule of ['bay', 'even'] as const) {
        const other = solveCounterweights(train, planes, rule)
        expectBalanced(train, other.counterweights)
        expect(other.mass).toBeGreaterThanOrEqual(mass * (1 - 1e-9))
      }
    },
  )

  it('by bays gives each throw of the flat-plane four two weights alike; its file holds four fifths of them', () => {
    const train = presetTrain('i4-2000')
    const { counterweights } = solveCounterweights(
      train,
      presentPlanes(presetDocument('i4-2000'), train),
      'bay',
    )
    counterweights.forEach((weight, i) => {
      expect(weight.mass).toBeCloseTo(train.counterweights[i].mass / 0.8, 5)
      expect(Math.cos(weight.angle - train.counterweights[i].angle)).toBeCloseTo(1, 12)
    })
    // over the whole crank it needs none at all
    expect(solveCounterweights(train, presentPlanes(presetDocument('i4-2000'), train)).mass).toBe(0)
  })

  it('evenly gives the cross-plane V8 the weights its file holds', () => {
    const train = presetTrain('v8x-5000')
    const { counterweights } = solveCounterweights(
      train,
      presentPlanes(presetDocument('v8x-5000'), train),
      'even',
    )
    counterweights.forEach(({ mass }, i) => expect(mass).toBeCloseTo(train.counterweights[i].mass, 5))
  })

  it('gives one throw the same weight on both sides, opposite the pin', () => {
    const train = presetTrain('single-450')
    const planes = presentPlanes(presetDocument('single-450'), train)
    const { counterweights } = solveCounterweights(train, planes)
    const [first, second] = moments(counterweights)
    expect(first).toBeCloseTo(second, 15)
    for (const { angle } of counterweights) expect(Math.cos(angle)).toBeCloseTo(-1, 14)
  })

  it('gives a crank that is alike from both ends webs that are alike', () => {
    const train = presetTrain('v8x-5000')
    const { counterweights } = solveCounterweights(train, webPlanes(presetDocument('v8x-5000'), train))
    const sizes = moments(counterweights)
    sizes.forEach((size, i) => expect(size).toBeCloseTo(sizes[sizes.length - 1 - i], 12))
  })

  it('keeps a weight that is fixed, and balances what it leaves', () => {
    const train = presetTrain('v8x-5000')
    const planes = presentPlanes(presetDocument('v8x-5000'), train).map((plane, i): Plane =>
      i === 2 ? { ...plane, fixed: { mass: 0.9, angle: 30 * DEG } } : plane,
    )
    const { counterweights, mass, least } = solveCounterweights(train, planes)
    expect(counterweights[2].mass).toBeCloseTo(0.9, 14)
    expect(counterweights[2].angle).toBeCloseTo(30 * DEG, 14)
    expectBalanced(train, counterweights)
    expect(mass - least).toBeLessThanOrEqual(1e-9 * mass)
  })

  it('within limits puts no more in a web than it may hold', () => {
    const document = presetDocument('v8x-5000')
    const train = presetTrain('v8x-5000')
    const most = halfDiscMoment(0.0895, 0.02, 7850) / 0.0528
    const free = solveCounterweights(train, presentPlanes(document, train))
    expect(Math.max(...free.counterweights.map(({ mass }) => mass))).toBeGreaterThan(most)
    const planes = presentPlanes(document, train).map((plane) => ({ ...plane, most }))
    const { counterweights, mass } = solveCounterweights(train, planes)
    expectBalanced(train, counterweights)
    expect(Math.max(...counterweights.map((weight) => weight.mass))).toBeLessThanOrEqual(most * (1 + 1e-12))
    expect(mass).toBeGreaterThan(free.mass)
  })

  const refusal = (solve: () => unknown) => {
    try {
      solve()
    } catch (error) {
      if (error instanceof CannotBalance) return error
      throw error
    }
    return null
  }

  it('refuses one plane against a couple, planes at one place, none, and full ones, and says what is left', () => {
    const train = trainOf(inline([0, 180]))
    const plane = { id: 'a', axial: 0.02, radius: 0.05 }
    const one = refusal(() => solveCounterweights(train, [plane]))
    expect(one).toMatchObject({ reason: 'one-place' })
    expect(one!.couple).toBeCloseTo(residualUnbalance(train).couple.size, 12)
    expect(refusal(() => solveCounterweights(train, [plane, { ...plane, id: 'b' }]))?.reason).toBe(
      'one-place',
    )
    expect(refusal(() => solveCounterweights(train, []))?.reason).toBe('no-plane')
    const fixed = { mass: 1, angle: 0 }
    expect(refusal(() => solveCounterweights(train, [{ ...plane, fixed }]))?.reason).toBe('no-plane')
    const small = [0, 0.1].map((axial, i) => ({ id: `${i}`, axial, radius: 0.05, most: 0.01 }))
    expect(refusal(() => solveCounterweights(train, small))?.reason).toBe('full')
    const bay = refusal(() => solveCounterweights(train, [plane, { ...plane, id: 'b', axial: 0.03 }], 'bay'))
    expect(bay).toMatchObject({ reason: 'no-plane', throws: ['2'] })
  })

  it('one plane is enough where the force alone stands right there', () => {
    const train = trainOf(inline([30]))
    const { counterweights } = solveCounterweights(train, [{ id: 'a', axial: 0, radius: 0.05 }])
    expectBalanced(train, counterweights)
    expect(counterweights[0].angle).toBeCloseTo(-150 * DEG, 12)
  })
})

describe('halfDiscMoment(radius, thickness, density), slugFor(…)', () => {
  it('a half disc holds what its slices hold', () => {
    const [radius, thickness, density] = [0.0895, 0.02, 7850]
    let sum = 0
    const steps = 100_000
    for (let i = 0; i < steps; i++) {
      const y = ((i + 0.5) / steps) * radius
      sum += 2 * Math.sqrt(radius * radius - y * y) * y * (radius / steps) * thickness * density
    }
    expect(halfDiscMoment(radius, thickness, density)).toBeCloseTo(sum, 8)
  })

  it('a slug adds the lacking moment less what it displaces', () => {
    const { volume, mass, diameter } = slugFor(0.02, 0.07, 0.02, 18_000, 7850)
    expect((mass - 7850 * volume) * 0.07).toBeCloseTo(0.02, 15)
    expect((Math.PI / 4) * diameter ** 2 * 0.02).toBeCloseTo(volume, 15)
    expect(() => slugFor(0.02, 0.07, 0.02, 7850, 7850)).toThrow(RangeError)
    expect(() => slugFor(0.02, 0, 0.02, 18_000, 7850)).toThrow(RangeError)
  })
})
