import { describe, expect, it } from 'vitest'
import { bobWeights, permissibleUnbalance, residualUnbalance } from '@/lib/mechanics/balance'
import { bobWeightCards, factorOfAll, factorOfOne } from '@/lib/mechanics/balance/bob-weight-card'
import { massEffect } from '@/lib/mechanics/balance/mass-change'
import { phasor } from '@/lib/mechanics/balance/phasor'
import { inTwoPlanes, residualInPlanes, toleranceShares } from '@/lib/mechanics/balance/two-planes'
import { pistonParts } from '@/scene/model/piston-parts'
import { presets } from '@/scene/model/presets'
import { presetDocument, presetTrain, RPM, trainOf } from './trains'

const cards = (document: Parameters<typeof pistonParts>[0]) =>
  bobWeightCards(trainOf(document), pistonParts(document))

describe('bobWeightCards(train, parts)', () => {
  it.each(presets.map(({ id }) => id))('%s: the lines add up to the bob-weight', (id) => {
    const document = presetDocument(id)
    cards(document).forEach((card, i) => {
      const sum = (moves: string, without = '') =>
        card.rows
          .filter((row) => row.moves === moves && row.part !== without)
          .reduce((total, row) => total + row.total, 0)
      expect(card.reciprocating).toBeCloseTo(sum('reciprocating'), 10)
      expect(card.rotating).toBeCloseTo(sum('rotating', 'oil'), 10)
      expect(card.total).toBe(bobWeights(trainOf(document))[i].mass)
      for (const row of card.rows) expect(row.total).toBeCloseTo(row.quantity * row.each, 10)
    })
  })

  it('the cross-plane V8 hangs two of everything; 50 % of all is 100 % of one (common practice)', () => {
    const [card] = cards(presetDocument('v8x-5000'))
    expect(card.rows.map(({ part, quantity }) => [part, quantity])).toEqual(
      ['piston', 'pin', 'locks', 'rings', 'small end', 'big end', 'shells', 'oil'].map((part) => [part, 2]),
    )
    expect(card.total).toBeCloseTo(1.7398, 4)
    expect(card.factor).toEqual({ ofAll: 0.5, ofOne: 1 })
    expect(factorOfAll(factorOfOne(0.37, 2), 2)).toBeCloseTo(0.37, 15)
  })

  it('parts that differ have a line each, with their cylinders', () => {
    const document = presetDocument('v8x-5000')
    document.cylinders[0] = { ...document.cylinders[0], pistonKg: 0.39 }
    const [card] = cards(document)
    const pistons = card.rows.filter(({ part }) => part === 'piston')
    expect(pistons).toMatchObject([
      { quantity: 1, each: 0.39, cylinders: ['2'] },
      { quantity: 1, each: 0.388, cylinders: ['1'] },
    ])
  })
})

describe('inTwoPlanes(force, couple, a, b), toleranceShares(a, b, centre)', () => {
  it('is the statics of two supports', () => {
    const [force, couple] = [
      { re: 3, im: -1 },
      { re: 0.4, im: 0.7 },
    ]
    const [a, b] = inTwoPlanes(force, couple, -0.1, 0.25)
    expect([a.re + b.re, a.im + b.im]).toEqual([expect.closeTo(3, 14), expect.closeTo(-1, 14)])
    expect(-0.1 * a.re + 0.25 * b.re).toBeCloseTo(0.4, 14)
    expect(-0.1 * a.im + 0.25 * b.im).toBeCloseTo(0.7, 14)
    expect(() => inTwoPlanes(force, couple, 0.1, 0.1)).toThrow(RangeError)
  })

  it('25.8 kg at G 16 and 7,200 rpm: 547 g mm, 274 in each plane', () => {
    // ISO 21940-11: U = 1000·m·G/ω g mm, split by the distances of the bearings; the figures are common practice
    const whole = permissibleUnbalance(25.8, 0.016, 7200 * RPM)! * 1e6
    expect(whole).toBeCloseTo(547.5, 1)
    const [near, far] = toleranceShares(-0.212, 0.212, 0).map((share) => share * whole)
    expect(near).toBeCloseTo(273.7, 1)
    expect(far).toBeCloseTo(273.7, 1)
    const uneven = toleranceShares(-0.1, 0.3, 0)
    expect([...uneven]).toEqual([expect.closeTo(0.7, 15), expect.closeTo(0.3, 15)])
    expect(toleranceShares(0, 1, 0.5)[0]).toBe(0.5)
    const far2 = toleranceShares(0, 1, 2)
    expect(far2).toEqual([0.3, 0.7])
  })
})

describe('massEffect(train, change)', () => {
  it('new pistons 8 g heavier on each bob-weight of the cross-plane V8: 372 g mm in each plane 318 mm apart', () => {
    // common practice: 353 g mm a throw, a couple of √10 × 106 mm × 353 = 118,259 g mm²
    const train = presetTrain('v8x-5000')
    const all = train.cylinders.map((_, index) => index)
    const effect = massEffect(train, { cylinders: all, moves: 'reciprocating', mass: 0.008 })
    expect(effect.change.static.size).toBeLessThan(1e-15)
    expect(effect.change.couple.size * 1e9).toBeCloseTo(118_259, -2)
    const planes = residualInPlanes(effect.change, -0.159, 0.159)
    for (const plane of planes) expect(phasor(plane).size * 1e6).toBeCloseTo(372, 0)
  })

  it('a piston 2 g heavier in one cylinder leaves half of 2 g × throw, and force at speed', () => {
    const train = presetTrain('v8x-5000')
    const effect = massEffect(train, { cylinders: [0], moves: 'reciprocating', mass: 0.002 })
    // factor 50 %, throw 44.1 mm: 44.1 g mm at 7,200 rpm is 25.1 N
    expect(effect.change.static.size * 1e6).toBeCloseTo(44.1, 9)
    expect(effect.change.static.size * (7200 * RPM) ** 2).toBeCloseTo(25.07, 2)
    expect(effect.change.static.angle).toBeCloseTo(train.throws[0].angle, 9)
    expect(effect.alongBore * 1e6).toBeCloseTo(88.2, 9)
    expect(effect.after.static.size).toBeGreaterThan(effect.before.static.size)
  })

  it('a big end counts in full, a part that would weigh nothing is refused', () => {
    const train = presetTrain('single-450')
    const { change, before, after } = massEffect(train, { cylinders: [0], moves: 'rotating', mass: -0.003 })
    expect(change.static.size).toBeCloseTo(0.003 * train.throws[0].radius, 15)
    expect(before).toEqual(residualUnbalance(train))
    expect(after).not.toEqual(before)
    expect(() => massEffect(train, { cylinders: [0], moves: 'reciprocating', mass: -1 })).toThrow(RangeError)
  })
})
