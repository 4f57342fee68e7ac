import { describe, expect, it } from 'vitest'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import { DEG, inline, presetDocument, presetTrain, trainOf } from './trains'

describe('buildPlan(train, speed)', () => {
  it('refuses a speed that is not a number of 0 or more', () => {
    const train = presetTrain('single-450')
    expect(() => buildPlan(train, -1)).toThrow(RangeError)
    expect(() => buildPlan(train, NaN)).toThrow(RangeError)
    expect(() => buildPlan(train, Infinity)).toThrow(RangeError)
  })

  it('cylinders of one geometry share a gas table, others have their own', () => {
    const tables = (id: string) => {
      const plan = buildPlan(presetTrain(id), 100)
      return plan.gas.model === 'heat-release' ? new Set(plan.gas.tables).size : 0
    }
    expect(tables('v8x-5000')).toBe(1)
    expect(tables('r7-11')).toBe(7)
    const document = presetDocument('i4-2000')
    document.cylinders[2].boreMm = 80
    const plan = buildPlan(trainOf(document), 100)
    expect(plan.gas.model === 'heat-release' && new Set(plan.gas.tables).size).toBe(2)
  })
})

describe('fillInstant(out, plan, angle)', () => {
  it('depends on the angle alone: filling others in between changes nothing', () => {
    const plan = buildPlan(presetTrain('r7-11'), 200)
    const [one, other] = [buildInstant(plan), buildInstant(plan)]
    fillInstant(one, plan, 1.234)
    for (const angle of [0, 5, -3, 1.234]) fillInstant(other, plan, angle)
    expect(other).toEqual(one)
  })

  it('repeats itself after a cycle', () => {
    const plan = buildPlan(presetTrain('v8x-5000'), 500)
    const [one, other] = [buildInstant(plan), buildInstant(plan)]
    fillInstant(one, plan, 100 * DEG)
    fillInstant(other, plan, 820 * DEG)
    one.crankPinVertical.forEach((force, i) => expect(other.crankPinVertical[i]).toBeCloseTo(force, 6))
  })

  it('at speed 0 leaves gas forces only', () => {
    const plan = buildPlan(presetTrain('i4-2000'), 0)
    const instant = buildInstant(plan)
    fillInstant(instant, plan, 30 * DEG)
    expect(instant.shakingVertical).toBe(0)
    expect(Math.abs(instant.inertiaTorque)).toBe(0)
    expect(instant.gasTorque).not.toBe(0)
    expect(instant.acceleration.every((a) => a === 0)).toBe(true)
  })

  it('a counterweight and a throw’s unbalance push outward, where they stand', () => {
    const bare = inline([90], { gas: { model: 'none' } })
    const weighted = trainOf({
      ...bare,
      throws: [{ ...bare.throws[0], unbalanceKgMm: 10 }],
      counterweights: [{ id: 'w', axialMm: 30, angleDeg: 300, massKg: 2, radiusMm: 15 }],
    })
    const at = (train: typeof weighted) => {
      const plan = buildPlan(train, 100)
      const instant = buildInstant(plan)
      fillInstant(instant, plan, 20 * DEG)
      return instant
    }
    const [with_, without] = [at(weighted), at(trainOf(bare))]
    const vertical = 100 * Math.cos(110 * DEG) + 300 * Math.cos(320 * DEG)
    const horizontal = 100 * Math.sin(110 * DEG) + 300 * Math.sin(320 * DEG)
    expect(with_.shakingVertical - without.shakingVertical).toBeCloseTo(vertical, 9)
    expect(with_.shakingHorizontal - without.shakingHorizontal).toBeCloseTo(horizontal, 9)
    expect(with_.coupleVertical - without.coupleVertical).toBeCloseTo(0.03 * 300 * Math.cos(320 * DEG), 9)
    // mains at −50 and 50 mm: a weight at 30 mm is carried 0.2 and 0.8
    const main = (k: number) => with_.mainVertical[k] - without.mainVertical[k]
    expect(main(0)).toBeCloseTo(50 * Math.cos(110 * DEG) + 60 * Math.cos(320 * DEG), 9)
    expect(main(1)).toBeCloseTo(50 * Math.cos(110 * DEG) + 240 * Math.cos(320 * DEG), 9)
  })

  it('a balance shaft turns at its ratio, and shakes with the square of it', () => {
    const shaft = { id: 's', angleDeg: 30, unbalanceKgMm: 5, axialMm: 40, horizontalMm: 0, verticalMm: 0 }
    const at = (speedRatio: -2 | 1 | null) => {
      const balanceShafts = speedRatio === null ? [] : [{ ...shaft, speedRatio }]
      const plan = buildPlan(trainOf(inline([0], { balanceShafts })), 100)
      const instant = buildInstant(plan)
      fillInstant(instant, plan, 20 * DEG)
      return instant
    }
    const none = at(null)
    const with1 = at(1)
    const withBack = at(-2)
    expect(with1.shakingVertical - none.shakingVertical).toBeCloseTo(50 * Math.cos(50 * DEG), 9)
    expect(withBack.shakingVertical - none.shakingVertical).toBeCloseTo(200 * Math.cos(-10 * DEG), 9)
    expect(withBack.shakingHorizontal - none.shakingHorizontal).toBeCloseTo(200 * Math.sin(-10 * DEG), 9)
    expect(withBack.coupleVertical - none.coupleVertical).toBeCloseTo(0.04 * 200 * Math.cos(-10 * DEG), 9)
    expect(withBack.mainVertical).toEqual(none.mainVertical)
  })
})
