import { describe, expect, it } from 'vitest'
import { firingChoice, type FiringQuestion } from '@/lib/mechanics/firing-choice'
import { firingAngles, firingEvents, firingIntervals, firingOf } from '@/lib/mechanics/firing'
import { DEG, inline, presetDocument, presetTrain, trainOf } from './trains'

const degrees = (angles: readonly number[]) => angles.map((angle) => Math.round((angle / DEG) * 1e6) / 1e6)

const choose = (topsDeg: number[], order: number[], more: Partial<FiringQuestion> = {}) => {
  const choice = firingChoice({
    tops: topsDeg.map((top) => top * DEG),
    order,
    cycle: 4 * Math.PI,
    stated: topsDeg.map(() => undefined),
    ...more,
  })
  return choice.ok ? degrees(choice.angles) : { breaksAt: choice.breaksAt }
}

describe('firingChoice({ tops, order, cycle, stated })', () => {
  it('takes each cylinder in the turn that keeps the order', () => {
    expect(choose([0, 180, 180, 0], [0, 2, 3, 1])).toEqual([0, 540, 180, 360])
  })

  it('fires two cylinders of one top dead centre a turn apart', () => {
    expect(choose([0, 0], [0, 1])).toEqual([0, 360])
  })

  it('takes the least sum of squared intervals: 405 and 315, not 45 and 675', () => {
    expect(choose([337.5, 22.5], [0, 1])).toEqual([337.5, 22.5])
  })

  it('on a tie takes the choice whose first event, then second, is earliest', () => {
    // three cylinders 120° apart in their natural order: the pause of 480° may follow any of them
    expect(choose([0, 120, 240], [0, 1, 2])).toEqual([0, 120, 240])
    expect(choose([240, 0, 120], [0, 1, 2])).toEqual([240, 0, 120])
  })

  it('spends the turn left over after the shortest interval', () => {
    expect(choose([0, 90, 200], [0, 1, 2])).toEqual([0, 450, 560])
  })

  it('has one choice for a two-stroke', () => {
    const twoStroke = { cycle: 2 * Math.PI }
    expect(choose([0, 120, 240], [0, 1, 2], twoStroke)).toEqual([0, 120, 240])
    expect(choose([0, 120, 240], [0, 2, 1], twoStroke)).toEqual({ breaksAt: 1 })
  })

  it('names the cylinder where the order breaks', () => {
    expect(choose([0, 180, 180, 0], [0, 1, 2, 3])).toEqual({ breaksAt: 3 })
  })

  it('follows a stated angle, within half a degree', () => {
    expect(choose([337.5, 22.5], [0, 1], { stated: [697.6 * DEG, undefined] })).toEqual([697.5, 382.5])
    expect(choose([337.5, 22.5], [0, 1], { stated: [337.5 * DEG, 382.5 * DEG] })).toEqual([337.5, 382.5])
    expect(choose([337.5, 22.5], [0, 1], { stated: [337.5 * DEG, 100 * DEG] })).toEqual({ breaksAt: 1 })
  })

  it('lets two cylinders fire together when that is stated, or when they are more than the cycle has turns', () => {
    const together = { stated: [0, undefined, undefined, 0] }
    expect(choose([0, 180, 180, 0], [0, 3, 1, 2], together)).toEqual([0, 180, 540, 0])
    expect(choose([0, 0], [0, 1], { cycle: 2 * Math.PI })).toEqual([0, 0])
    expect(choose([0, 0, 0], [0, 1, 2])).toEqual([0, 0, 360])
  })

  it('takes top dead centres that differ by rounding for one', () => {
    expect(choose([0, 359.999999], [0, 1])).toEqual([0, 359.999999])
    expect(choose([0, 0.001, 0], [0, 1, 2], { cycle: 2 * Math.PI })).toEqual([0, 0.001, 0])
  })

  it('answers at once for 64 cylinders, in any arrangement', () => {
    const all = Array.from({ length: 64 }, (_, index) => index)
    const even = choose(
      all.map((k) => (k * 720) / 64),
      all,
    )
    expect(even).toEqual(all.map((k) => (k * 720) / 64))
    // 64 of one top dead centre: every place for the two turns is tried
    const before = performance.now()
    const same = choose(
      all.map(() => 0),
      all,
    ) as number[]
    expect(performance.now() - before).toBeLessThan(2000)
    expect(same.filter((angle) => angle === 0)).toHaveLength(63)
  })
})

describe('firingEvents(train) and firingOf(train)', () => {
  it('lists events in the firing order, at exact top dead centres', () => {
    const train = presetTrain('i4-2000')
    const events = firingEvents(train)
    expect(events.map(({ cylinder }) => train.cylinders[cylinder].id)).toEqual(['1', '3', '4', '2'])
    const top = Math.asin(8 / (146.5 + 43.8)) / DEG
    events.forEach(({ angle }, place) => expect(angle / DEG).toBeCloseTo(top + 180 * place, 10))
  })

  it.each([
    // intervals by the layout's own arithmetic (common practice)
    ['p2-270-700', [270, 450], false],
    ['v2-45-1600', [405, 315], false],
    ['v2-90-1000', [450, 270], false],
    ['i4x-1000', [270, 180, 90, 180], false],
    ['v8x-5000', [90, 90, 90, 90, 90, 90, 90, 90], true],
    ['m6-2t-520', [60, 60, 60, 60, 60, 60], true],
  ])('%s fires at intervals of %j', (id, intervals, even) => {
    const firing = firingOf(presetTrain(id))
    expect(degrees(firing.intervals)).toEqual(intervals)
    expect(firing.even).toBe(even)
  })

  it('gives each bank and collector its own intervals', () => {
    const train = presetTrain('v8x-5000')
    const firing = firingOf(train)
    for (const bank of firing.banks) {
      expect(degrees(bank.intervals).toSorted((a, b) => a - b)).toEqual([90, 180, 180, 270])
      expect(bank.even).toBe(false)
    }
    const crossed = trainOf({
      ...presetDocument('v8x-5000'),
      collectors: [
        { id: 'a', cylinders: ['1', '4', '6', '7'] },
        { id: 'b', cylinders: ['2', '3', '5', '8'] },
        { id: 'one', cylinders: ['3'] },
      ],
    })
    const [a, b, one] = firingOf(crossed).collectors
    expect(degrees(a.intervals)).toEqual([180, 180, 180, 180])
    expect(b.even).toBe(true)
    expect(degrees(one.intervals)).toEqual([720])
  })

  it('alternatesBanks looks all the way round, and one bank never alternates', () => {
    expect(firingOf(presetTrain('v8f-4200')).alternatesBanks).toBe(true)
    expect(firingOf(presetTrain('v8x-5000')).alternatesBanks).toBe(false)
    expect(firingOf(presetTrain('i6-3000')).alternatesBanks).toBe(false)
    expect(firingOf(presetTrain('single-450')).alternatesBanks).toBe(false)
  })

  it('a bank without cylinders has no intervals', () => {
    const train = trainOf(
      inline([0], {
        banks: [
          { id: 'A', angleDeg: 0 },
          { id: 'B', angleDeg: 90 },
        ],
      }),
    )
    expect(firingOf(train).banks).toEqual([
      { intervals: [4 * Math.PI], even: true },
      { intervals: [], even: true },
    ])
  })

  it('firingIntervals sum to the cycle when cylinders fire together', () => {
    expect(firingIntervals([1, 1, 1], 4 * Math.PI).intervals).toEqual([0, 0, 4 * Math.PI])
  })

  it('firingAngles throws for an order that cannot be', () => {
    const train = presetTrain('i4-2000')
    expect(() => firingAngles({ ...train, firingOrder: [0, 1, 2, 3] })).toThrow('breaks at cylinder 4')
  })
})
