import { describe, expect, it } from 'vitest'
import { DEG, inLine, pins, searchLayouts, vee } from '@/tests/support/mechanics/layout-search'

/**
 * What the layout finder comes upon by itself. The layouts are common practice; nothing in the search names any of them. Wishes
 * as limits leave only phasings that fulfil them; wishes as weights rank every phasing of all grids.
 */
const even = { unevenness: { atMost: 0 } }
const flat = /^0\/(180\/180\/0|0\/180\/180|180\/0\/180)$/
const cross = /^0(?=.*\/90)(?=.*\/180)(?=.*\/270)/

describe('90° V8, two rods a throw', () => {
  const wishes = { ...even, sameBank: { atMost: 0 } }

  it('fires evenly and its banks alternate: every layout is flat-plane, 0/180/180/0 the first', () => {
    const { layouts } = searchLayouts(vee(8, 90, { wishes }))
    expect(pins(layouts[0])).toBe('0/180/180/0')
    for (const layout of layouts) expect(pins(layout)).toMatch(flat)
    expect(layouts[0].secondForce).toBeCloseTo(4 * Math.SQRT2, 9)
  })

  it('the same by weights, out of every phasing of the 10° and 15° grids', () => {
    const found = searchLayouts(vee(8, 90, { wishes: { unevenness: {}, sameBank: {} } }))
    expect(found.regularDivisions).toEqual([36, 24])
    expect(found.phasings).toBeGreaterThan(14_000)
    expect(pins(found.layouts[0])).toBe('0/180/180/0')
    for (const layout of found.layouts.filter(({ score }) => score < 1e-9)) expect(pins(layout)).toMatch(flat)
  })

  it('when only even firing is wished, cross-plane cranks fulfil the wish as well', () => {
    const { layouts } = searchLayouts(vee(8, 90, { wishes: even }))
    const others = layouts.filter((layout) => cross.test(pins(layout)))
    expect(others.length).toBeGreaterThan(0)
    for (const layout of others) {
      expect(layout.score).toBe(layouts[0].score)
      expect(layout.sameBank).toBeGreaterThan(0)
    }
  })

  it('fires evenly without a free second-order force: every layout is cross-plane, 0/90/270/180 the first', () => {
    const { layouts } = searchLayouts(vee(8, 90, { wishes: { ...even, secondForce: { atMost: 0 } } }))
    expect(pins(layouts[0])).toBe('0/90/270/180')
    for (const layout of layouts) expect(pins(layout)).toMatch(cross)
    expect(layouts[0].couple1.forward).toBeCloseTo(Math.sqrt(10), 9)
    expect(layouts[0].couple1.backward).toBeLessThan(1e-9)
    expect(layouts[0].secondCouple).toBeLessThan(1e-9)
  })

  it('the same by weights, out of every phasing of the 10° and 15° grids', () => {
    const found = searchLayouts(vee(8, 90, { wishes: { unevenness: {}, secondForce: {} } }))
    expect(found.phasings).toBeGreaterThan(14_000)
    expect(pins(found.layouts[0])).toBe('0/90/270/180')
    for (const layout of found.layouts.filter(({ score }) => score < 1e-9))
      expect(pins(layout)).toMatch(cross)
  })

  it('without the wish about the second order a flat-plane crank is first', () => {
    const { layouts } = searchLayouts(vee(8, 90, { wishes: even }))
    expect(pins(layouts[0])).toMatch(flat)
  })
})

describe('three in line', () => {
  it('fires evenly with 0-240-120, or its mirror 0-120-240, alone', () => {
    const { layouts } = searchLayouts(inLine(3, { wishes: even }))
    expect(layouts.map(pins)).toEqual(['0/120/240'])
    expect(layouts[0].intervals.map((interval) => interval / DEG)).toEqual(
      [240, 240, 240].map((x) => expect.closeTo(x, 9)),
    )
  })

  it('the same by weight, out of every phasing of the 5° grid', () => {
    const found = searchLayouts(inLine(3, { wishes: { unevenness: {} } }))
    expect(found.regularDivisions).toEqual([72])
    expect(pins(found.layouts[0])).toBe('0/120/240')
    expect(found.layouts[1].score).toBeGreaterThan(found.layouts[0].score)
  })

  it('with a wish for a small first-order couple instead, other phasings come before it', () => {
    const { layouts } = searchLayouts(inLine(3, { wishes: { firstCouple: {} } }))
    expect(layouts[0].firstCouple).toBeLessThan(1e-9)
    expect(layouts.findIndex((layout) => pins(layout) === '0/120/240')).not.toBe(0)
    expect(pins(layouts[0])).toBe('0/180/0')
  })
})

describe('90° V6 with pins split by −60° to 60° in steps of 3°', () => {
  const splits = Array.from({ length: 41 }, (_, i) => (i - 20) * 3 * DEG)

  it('fires evenly with 30° split pins alone', () => {
    const { layouts } = searchLayouts(vee(6, 90, { splits, wishes: even }))
    expect(layouts.length).toBeGreaterThan(0)
    for (const { split } of layouts) expect(split / DEG).toBeCloseTo(-30, 9)
    expect(pins(layouts[0])).toBe('0/120/240')
    expect(layouts[0].firstCouple).toBeCloseTo(0.4483, 4)
  })

  it('the same by weight, out of every phasing, split and grid', () => {
    const found = searchLayouts(vee(6, 90, { splits, wishes: { unevenness: {} } }))
    expect(found.phasings).toBeGreaterThan(18_000)
    expect(Math.abs(found.layouts[0].split / DEG)).toBeCloseTo(30, 9)
    expect(found.layouts[0].even).toBe(true)
  })

  it('with a wish for no free second-order force instead, common pins fulfil it as well', () => {
    const { layouts } = searchLayouts(vee(6, 90, { splits: [0], wishes: { secondForce: {} } }))
    expect(layouts[0].score).toBeLessThan(1e-9)
    const split = searchLayouts(vee(6, 90, { splits, wishes: { secondForce: {} } })).layouts
    expect(split[0].score).toBeLessThan(1e-9)
  })

  it('cannot fire evenly on common pins', () => {
    const found = searchLayouts(vee(6, 90, { wishes: even }))
    expect(found.layouts).toEqual([])
    expect(found.miss?.impossible).toEqual(['unevenness'])
  })
})
