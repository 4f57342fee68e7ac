import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { bobWeights, massSplit, permissibleUnbalance, residualUnbalance } from '@/lib/mechanics/balance'
import { DEG, inline, presetDocument, presetTrain, RPM, trainOf } from './trains'

describe('massSplit(cylinder)', () => {
  it('gives the small end mass·h/l and the big end the rest', () => {
    const [cylinder] = trainOf(inline([0])).cylinders
    const { reciprocating, rotating } = massSplit(cylinder)
    expect(reciprocating).toBeCloseTo(0.4 + (0.6 * 42) / 140, 14)
    expect(rotating).toBeCloseTo((0.6 * 98) / 140, 14)
  })
})

describe('bobWeights(train)', () => {
  it('hangs rotating and oil, and the balance factor’s share of all the reciprocating mass, on each throw', () => {
    // common practice: 1,739.8 g for this invented V8 at a factor of 50 %
    const [weight] = bobWeights(presetTrain('v8x-5000'))
    expect(weight.mass).toBeCloseTo(1.7398, 4)
    expect(weight.mass).toBeCloseTo(weight.rotating + weight.oil + 0.5 * weight.reciprocating, 14)
    expect(weight.oil).toBeCloseTo(0.008, 14)
  })

  it('counts a radial’s links on the one throw', () => {
    const train = presetTrain('r7-11')
    const [weight] = bobWeights(train)
    const total = train.cylinders.reduce(
      (sum, { pistonMass, rod, bigEndBearing }) => sum + pistonMass + rod.mass + bigEndBearing,
      0,
    )
    expect(weight.reciprocating + weight.rotating).toBeCloseTo(total, 12)
  })

  it.each([0, 1])('at a balance factor of %i hangs none or all of it', (balanceFactor) => {
    const [weight] = bobWeights(trainOf({ ...presetDocument('single-450'), balanceFactor }))
    expect(weight.mass).toBeCloseTo(weight.rotating + weight.oil + balanceFactor * weight.reciprocating, 14)
  })
})

describe('residualUnbalance(train)', () => {
  it('is nothing where counterweights answer the throw and its bob-weight without the oil', () => {
    const document = inline([30], {
      masses: { pistonKg: 0.4, rod: { massKg: 0.6, cgFromBigEndMm: 42 }, oilAllowanceKg: 0.003 },
      balanceFactor: 0.5,
    })
    const [{ mass: card, oil }] = bobWeights(trainOf(document))
    const mass = card - oil
    const train = trainOf({
      ...document,
      counterweights: [-20, 20].map((axialMm, k) => ({
        id: `${k}`,
        axialMm,
        angleDeg: 210,
        massKg: mass / 2,
        radiusMm: 40,
      })),
    })
    expect(residualUnbalance(train)).toEqual({ static: { size: 0, angle: 0 }, couple: { size: 0, angle: 0 } })
  })

  it('without counterweights is the bob-weight on its throw, and its couple about the reference place', () => {
    const train = trainOf({ ...inline([0, 180]), referenceAxialMm: -100 })
    const [{ mass }] = bobWeights(train)
    const { static: whole, couple } = residualUnbalance(train)
    expect(whole.size).toBe(0)
    // (100 − 200) mm × mass × 40 mm: towards the second throw
    expect(couple.size).toBeCloseTo(0.1 * mass * 0.04, 12)
    expect(Math.cos(couple.angle)).toBeCloseTo(-1, 12)
  })

  it('a counterweight that is not opposite leaves what it lacks and what it adds', () => {
    const train = trainOf({
      ...inline([0], { masses: { pistonKg: 0.4, rod: { massKg: 0.6, cgFromBigEndMm: 0 } } }),
      counterweights: [{ id: 'w', axialMm: 0, angleDeg: 90, massKg: 0.6, radiusMm: 40 }],
    })
    const { static: whole } = residualUnbalance(train)
    expect(whole.size).toBeCloseTo(0.6 * 0.04 * Math.SQRT2, 14)
    expect(whole.angle).toBeCloseTo(45 * DEG, 12)
  })
})

describe('permissibleUnbalance(mass, grade, speed)', () => {
  it('is 547 g mm for a 25.8 kg crank at G 16 and 7,200 rpm', () => {
    // ISO 21940-11: 9549 × 16 × 25.8 / 7200 g mm
    expect(permissibleUnbalance(25.8, 0.016, 7200 * RPM)! * 1e6).toBeCloseTo(547.5, 1)
    expect(permissibleUnbalance(25.8, 0.016, 0)).toBeNull()
  })

  it('in an analysis is for the greatest speed, in kg mm, and null without a crank mass', () => {
    const document = presetDocument('v8x-5000')
    const grade = (json: unknown, gradeMmS?: number) =>
      analyse(trainOf(json), { speed: 100, include: ['balance'], gradeMmS }).balance!.grade
    expect(grade(document)).toEqual({ permissibleKgMm: expect.closeTo(0.5475, 4), gradeMmS: 16 })
    expect(grade(document, 40)!.permissibleKgMm).toBeCloseTo((0.5475 * 40) / 16, 3)
    expect(grade({ ...document, crankMassKg: undefined })).toBeNull()
    expect(grade({ ...document, operating: undefined })!.permissibleKgMm).toBeCloseTo((25.8 * 16) / 100, 10)
  })
})
