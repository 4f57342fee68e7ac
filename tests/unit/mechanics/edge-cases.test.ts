import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import { DEG, inline, presetDocument, presetTrain, trainOf } from './trains'

const all = (json: unknown, speed = 300) => analyse(trainOf(json), { speed, stepDeg: 10 })

describe('trains at the edge of the usual', () => {
  it('a single cylinder with one throw and nothing else', () => {
    const answer = all(inline([0], { mains: [], firingOrder: ['1'] }))
    expect(answer.firing!.intervalsDeg).toEqual([720])
    expect(answer.shaking!.coupleVerticalNm.every((couple) => couple === 0)).toBe(true)
  })

  it('a two-stroke wraps from 359.99° to 0°', () => {
    const plan = buildPlan(presetTrain('single-125-2t'), 500)
    const [end, start] = [buildInstant(plan), buildInstant(plan)]
    fillInstant(end, plan, 359.99 * DEG)
    fillInstant(start, plan, 0)
    expect(Math.abs(end.pressure[0] / start.pressure[0] - 1)).toBeLessThan(1e-3)
    fillInstant(end, plan, 360 * DEG)
    expect(end.pressure[0]).toBeCloseTo(start.pressure[0], 4)
  })

  it('the direction of rotation changes no figure', () => {
    const document = presetDocument('v2-45-1600')
    expect(all({ ...document, rotation: 'counterclockwise' })).toEqual(
      all({ ...document, rotation: 'clockwise' }),
    )
  })

  it('a negative offset mirrors a positive one', () => {
    const at = (offsetMm: number) => {
      const document = inline([0], { gas: { model: 'none' } })
      return all({ ...document, cylinderDefaults: { ...document.cylinderDefaults, offsetMm } })
    }
    const [plus, minus] = [at(9), at(-9)]
    expect(minus.kinematics!['1'].tdcDeg).toBeCloseTo(360 - plus.kinematics!['1'].tdcDeg, 10)
    expect(minus.kinematics!['1'].strokeMm).toBeCloseTo(plus.kinematics!['1'].strokeMm, 12)
    plus.angleDeg.forEach((_, k) => {
      const mirror = (plus.angleDeg.length - k) % plus.angleDeg.length
      expect(minus.kinematics!['1'].pinHeightMm[k]).toBeCloseTo(plus.kinematics!['1'].pinHeightMm[mirror], 10)
      expect(minus.loads!['1'].sideThrustN[k]).toBeCloseTo(-plus.loads!['1'].sideThrustN[mirror], 6)
    })
  })

  it('a rod hardly longer than the throw', () => {
    const document = inline([0], { gas: { model: 'none' } })
    const answer = all({ ...document, cylinderDefaults: { ...document.cylinderDefaults, rodLengthMm: 42 } })
    expect(answer.kinematics!['1'].strokeMm).toBeCloseTo(80, 10)
    expect(answer.loads!['1'].sideThrustN.every(Number.isFinite)).toBe(true)
  })

  it('two rods side by side make a couple, fork and blade do not', () => {
    const document = { ...presetDocument('v2-90-1000'), counterweights: [] }
    const couple = (json: unknown) => Math.max(...all(json).shaking!.coupleHorizontalNm.map(Math.abs))
    const middle = document.cylinders.map((cylinder) => ({ ...cylinder, axialMm: 0 }))
    expect(couple(document)).toBeGreaterThan(1)
    expect(couple({ ...document, cylinders: middle })).toBeLessThan(1e-9)
  })

  it('pins split by 60° fire a 60° V6 evenly', () => {
    expect(all(presetDocument('v6-60-3000')).firing!.intervalsDeg.map(Math.round)).toEqual([
      120, 120, 120, 120, 120, 120,
    ])
  })

  it('no counterweights, and counterweights without mass, are the same', () => {
    const document = presetDocument('i4-2000')
    const massless = document.counterweights.map((weight) => ({ ...weight, massKg: 0 }))
    expect(all({ ...document, counterweights: massless })).toEqual(all({ ...document, counterweights: [] }))
  })

  it('a heavier piston in one cylinder shakes an otherwise balanced six', () => {
    const document = presetDocument('i6-3000')
    const first = (json: unknown) => all(json).orders!.find(({ order }) => order === 1)!.vertical.amplitudeN
    expect(first(document)).toBeLessThan(1e-6)
    document.cylinders[2].pistonKg = document.masses.pistonKg! + 0.002
    // 2 g on a throw of 44.4 mm at 300 rad/s
    expect(first(document)).toBeCloseTo(0.002 * 0.0444 * 300 ** 2, 3)
  })

  it('cylinders stated to fire together do', () => {
    const document = inline([0, 180, 180, 0])
    document.cylinders[0].firesAtDeg = 0
    document.cylinders[3].firesAtDeg = 0
    const { firing } = all({ ...document, firingOrder: ['1', '4', '2', '3'] })
    expect(firing!.intervalsDeg.map((interval) => Math.round(interval))).toEqual([0, 180, 360, 180])
  })

  it.each([28, 64])('%i cylinders in line', (count) => {
    const pins = Array.from({ length: count }, (_, k) => (360 - (720 * k) / count + 720) % 360)
    const answer = all(inline(pins, { gas: { model: 'none' } }))
    expect(answer.firing!.even).toBe(true)
    expect(Object.keys(answer.loads!)).toHaveLength(count)
    expect(Object.keys(answer.mains!)).toHaveLength(count + 1)
  })
})
