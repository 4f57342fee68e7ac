import { describe, expect, it } from 'vitest'
import type { CrankTrain } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import { changed } from './change'

const train = (preset: string, changes: Record<string, unknown> = {}) =>
  toTrain(changed(preset, changes) as CrankTrain)

describe('toTrain(document)', () => {
  it('turns units to SI', () => {
    const v8 = train('v8x-5000')
    expect(v8.cycle).toBe(4 * Math.PI)
    expect(v8.cylinders[0].bore).toBe(0.095)
    expect(v8.throws[1].angle).toBeCloseTo(Math.PI / 2, 15)
    expect(v8.throws[0].radius).toBeCloseTo(0.0441, 15)
    expect(v8.throws[0].unbalance).toBeCloseTo(0.0631119, 15)
    expect(v8.cylinders[0].rod.inertia).toBeCloseTo(2889e-6, 15)
    expect(v8.operating.max).toBeCloseTo((7200 * 2 * Math.PI) / 60, 10)
    expect(v8.crankcasePressure).toBeCloseTo(101325, 8)
    expect(v8.gas).toMatchObject({ intakePressure: 1e5, heatPerCycle: 1641 })
  })

  it('resolves references to indices, whatever their order', () => {
    const v8 = train('v8x-5000')
    expect(v8.cylinders[1]).toMatchObject({ id: '1', bank: 1, throw: 0 })
    expect(v8.firingOrder.map((cylinder) => v8.cylinders[cylinder].id).join('-')).toBe('1-8-4-3-6-5-7-2')
    expect(v8.collectors[0].cylinders.map((cylinder) => v8.cylinders[cylinder].id)).toEqual([
      '2',
      '4',
      '6',
      '8',
    ])
    expect(train('r7-11').cylinders[4].link).toMatchObject({ master: 0, knuckleRadius: 0.062 })
  })

  it('merges a cylinder’s own fields over the common ones, a whole rod too', () => {
    const { cylinders } = train('r7-11')
    expect(cylinders[0].rod).toMatchObject({ mass: 2.75, rigid: true })
    expect(cylinders[1].rod.mass).toBe(0.76)
    expect(cylinders[1].rod.inertia).toBeCloseTo(6247e-6, 15)
    expect(cylinders[1].bigEndBearing).toBe(0)
    expect(cylinders[0].bigEndBearing).toBe(0.42)
    expect(cylinders[1].pistonMass).toBeCloseTo(1.18 + 0.33 + 0.12 + 0.01, 14)
  })

  it('a rod without inertia is the two-mass equivalent', () => {
    const { rod } = train('i4-2000', { 'masses.rod': { massKg: 0.6, cgFromBigEndMm: 40 } }).cylinders[0]
    expect(rod.rigid).toBe(false)
    expect(rod.inertia).toBeCloseTo(0.6 * 0.04 * 0.1065, 15)
  })

  it('takes couples about the middle of the cylinders, or about the stated place', () => {
    expect(train('v8x-5000').referenceAxial).toBe(0)
    expect(train('v8x-5000', { 'cylinders.7.axialMm': 1170 }).referenceAxial).toBeCloseTo(0.5, 15)
    expect(train('v8x-5000', { referenceAxialMm: -25 }).referenceAxial).toBe(-0.025)
  })

  it('sorts the mains along the crank', () => {
    const { mains } = train('i3-1000', { 'mains.0.axialMm': 500 })
    expect(mains.map(({ axial }) => axial)).toEqual(mains.map(({ axial }) => axial).toSorted((a, b) => a - b))
    expect(mains.at(-1)!.id).toBe('M1')
  })

  it('leaves the document as it was', () => {
    const document = changed('r7-11') as CrankTrain
    const before = structuredClone(document)
    toTrain(document)
    expect(document).toEqual(before)
  })
})
