import { describe, expect, it } from 'vitest'
import { inertiaScale } from '@/lib/mechanics/balance/inertia-scale'
import { designShafts, type ShaftWish } from '@/lib/mechanics/balance/shaft-design'
import { reciprocatingAlone, textbookOrders } from '@/lib/mechanics/balance/textbook-orders'
import { bare, exactOrders } from '@/lib/mechanics/balance/turning'
import { balanceVerdict } from '@/lib/mechanics/balance/verdict'
import type { BalanceShaft, Train } from '@/lib/mechanics/train'
import { presetTrain } from './trains'

const at = { horizontal: 0.06, vertical: -0.12 }
const withShafts = (train: Train, balanceShafts: BalanceShaft[]): Train => ({ ...train, balanceShafts })
const late = (shafts: BalanceShaft[], by: number) =>
  shafts.map((shaft) => ({ ...shaft, angle: shaft.angle + by }))

describe('designShafts(train, wish)', () => {
  it('a shaft at crank speed against it takes the backward couple of the three, and wrongly phased adds to it', () => {
    const train = presetTrain('i3-1000')
    const [before] = exactOrders(train)
    // common practice: 0.866 F1·a backward, with a balance factor of 50 % nothing forward is left
    const { force, spacing } = inertiaScale(train)
    const [textbook] = textbookOrders(train)
    expect(textbook.couple.backward.size / (force * spacing!)).toBeCloseTo(0.866, 3)
    expect(textbook.couple.forward.size / (force * spacing!)).toBeLessThan(1e-3)
    // the cylinders' offset of 7 mm moves the exact first order a little
    expect(before.couple.backward.size / textbook.couple.backward.size).toBeCloseTo(1, 2)
    const shafts = designShafts(train, { order: 1, remove: 'couple', places: [-0.1, 0.1], ...at })
    expect(shafts).toHaveLength(2)
    for (const { speedRatio, unbalance } of shafts) {
      expect(speedRatio).toBe(-1)
      expect(unbalance * 0.2).toBeCloseTo(before.couple.backward.size, 12)
    }
    const left = (more: BalanceShaft[]) => exactOrders(withShafts(train, more))[0]
    expect(left(shafts).couple.backward.size).toBeLessThan(1e-12 * before.couple.backward.size + 1e-15)
    expect(left(shafts).force.backward.size).toBeLessThan(1e-12)
    expect(left(late(shafts, Math.PI)).couple.backward.size).toBeCloseTo(2 * before.couple.backward.size, 12)
    // 60° late leaves as much as there was, whatever it is worth less than nothing beyond
    expect(left(late(shafts, Math.PI / 3)).couple.backward.size).toBeCloseTo(before.couple.backward.size, 12)
    expect(left(late(shafts, Math.PI / 2)).couple.backward.size).toBeGreaterThan(before.couple.backward.size)
  })

  it('a pair at twice the speed takes the second-order force of the flat-plane four', () => {
    const train = presetTrain('i4-2000')
    const [, before] = exactOrders(train)
    const { force, ratio } = inertiaScale(train)
    const [, alone] = exactOrders(reciprocatingAlone(train))
    // common practice: 4 F2 by the first term; the exact second order is some 2 % more
    expect(alone.force.major / (force * ratio)).toBeGreaterThan(4)
    expect(alone.force.major / (force * ratio)).toBeLessThan(4.12)
    const shafts = designShafts(train, { order: 2, remove: 'force', places: [0], ...at })
    expect(shafts.map(({ speedRatio }) => speedRatio)).toEqual([2, -2])
    expect(shafts.map(({ horizontal }) => horizontal)).toEqual([0.06, -0.06])
    const left = (more: BalanceShaft[]) => exactOrders(withShafts(train, more))[1]
    expect(left(shafts).force.major).toBeLessThan(1e-12 * force)
    expect(left(late(shafts, Math.PI)).force.major).toBeCloseTo(2 * before.force.major, 12)
    // adding the designed ones again finds nothing more to do
    expect(
      designShafts(withShafts(train, shafts), { order: 2, remove: 'force', places: [0], ...at }),
    ).toEqual([])
  })

  it('takes force and couple together, and leaves the one that was not asked for', () => {
    const train = presetTrain('p2-270-700')
    const [before] = exactOrders(train)
    const places = [-0.15, 0.02]
    const left = (remove: ShaftWish['remove']) =>
      exactOrders(withShafts(train, designShafts(train, { order: 1, remove, places, ...at })))[0]
    const both = left('both')
    expect(both.force.backward.size + both.couple.backward.size).toBeLessThan(1e-12)
    const forceOnly = left('force')
    expect(forceOnly.force.backward.size).toBeLessThan(1e-12)
    expect(forceOnly.couple.backward.size).toBeCloseTo(before.couple.backward.size, 12)
    const coupleOnly = left('couple')
    expect(coupleOnly.couple.backward.size).toBeLessThan(1e-12)
    expect(coupleOnly.force.backward.size).toBeCloseTo(before.force.backward.size, 12)
  })

  it('refuses a couple at one place, and names shafts freshly', () => {
    const train = presetTrain('i3-1000')
    const wish: ShaftWish = { order: 1, remove: 'couple', places: [0.1], ...at }
    expect(() => designShafts(train, wish)).toThrow(RangeError)
    expect(() => designShafts(train, { ...wish, places: [0.1, 0.1] })).toThrow(RangeError)
    const [one] = designShafts(train, { ...wish, places: [-0.1, 0.1] })
    expect(one.id).toBe('S1')
    const again = designShafts(withShafts(train, [{ ...one, unbalance: 0 }]), {
      ...wish,
      places: [-0.1, 0.1],
    })
    expect(again.map(({ id }) => id)).toEqual(['S2', 'S3'])
  })
})

describe('balanceVerdict(train, bare, now)', () => {
  const of = (id: string) => {
    const train = presetTrain(id)
    return balanceVerdict(train, exactOrders(bare(train)), exactOrders(train))
  }
  const named = (id: string) => of(id).map(({ remedy, kind }) => `${remedy}: ${kind}`)

  it('the cross-plane V8 needs counterweights alone, and has them', () => {
    expect(named('v8x-5000')).toEqual(['counterweights: couple'])
    expect(of('v8x-5000')[0].left).toBe(0)
  })

  it('the flat-plane four needs shafts at twice the speed, the three a shaft against the crank', () => {
    expect(named('i4-2000')).toEqual(['shafts at twice the speed: force'])
    expect(named('i3-1000')).toContain('counter-turning shaft: couple')
    expect(named('i3-1000')).not.toContain('shafts at twice the speed: force')
  })

  it('the 90° V6 on split pins keeps a backward couple that its counterweights cannot reach', () => {
    const backward = of('v6-90s-3200').find(({ remedy }) => remedy === 'counter-turning shaft')!
    expect(backward.kind).toBe('couple')
    expect(backward.left).toBeCloseTo(backward.bare, 9)
  })

  it('a shaft that is fitted is seen', () => {
    const train = presetTrain('i4-2000')
    const shafts = designShafts(train, { order: 2, remove: 'force', places: [0], ...at })
    const [part] = balanceVerdict(train, exactOrders(bare(train)), exactOrders(withShafts(train, shafts)))
    expect(part).toMatchObject({ remedy: 'shafts at twice the speed', kind: 'force', left: 0 })
    expect(part.bare).toBeGreaterThan(0)
  })
})
