import { describe, expect, it } from 'vitest'
import { intervalSpread } from '@/lib/mechanics/interval-spread'
import { rankedFiringOrders, rankFiringOrders, rankOrder } from '@/lib/mechanics/firing-ranking'
import { firingOf } from '@/lib/mechanics/firing'
import { succession } from '@/lib/mechanics/succession'
import { DEG, inline, presetDocument, presetTrain, trainOf } from './trains'

const oddPins = (count: number) => Array.from({ length: count }, (_, k) => (k * 137.3) % 360)
/** A four-stroke in line that fires in the order in which its pins come up, however uneven. */
const uneven = (count: number) => {
  const pins = oddPins(count)
  const order = pins.map((_, k) => k).sort((a, b) => ((360 - pins[a]) % 360) - ((360 - pins[b]) % 360))
  return trainOf(inline(pins, { firingOrder: order.map((k) => `${k + 1}`) }))
}

describe('intervalSpread(intervals)', () => {
  it('is the greatest less the least, and the rms from the mean', () => {
    expect(intervalSpread([270, 450])).toEqual({ spread: 180, rms: 90 })
    expect(intervalSpread([720])).toEqual({ spread: 0, rms: 0 })
    expect(intervalSpread([])).toEqual({ spread: 0, rms: 0 })
  })
})

describe('succession(train, order)', () => {
  it('is none for one cylinder, and closes the cycle for two', () => {
    expect(succession(presetTrain('single-450'), [0])).toEqual({
      sameBank: 0,
      sameThrow: 0,
      adjacentThrow: 0,
    })
    expect(succession(presetTrain('v2-45-1600'), [0, 1])).toEqual({
      sameBank: 0,
      sameThrow: 2,
      adjacentThrow: 0,
    })
  })

  it('takes neighbours by their place along the crank, not by their place in the list', () => {
    const document = presetDocument('i4-2000')
    const [first, second, third, fourth] = document.throws
    document.throws = [third, first, fourth, second]
    expect(succession(trainOf(document), [0, 2, 3, 1])).toEqual(
      succession(presetTrain('i4-2000'), [0, 2, 3, 1]),
    )
  })
})

describe('rankedFiringOrders(train, { even, keep })', () => {
  it('ranks by evenness, then successions on a bank, on a throw, on neighbours, then collectors', () => {
    for (const id of ['v8x-5000', 'i4x-1000', 'b6-3400']) {
      const { orders, found } = rankedFiringOrders(presetTrain(id), { even: false })
      expect(orders).toHaveLength(found)
      const keys = orders.map((ranked) =>
        [
          ...[ranked.spread, ranked.rms].map((angle) => Math.round(angle * 1e7)),
          ...[ranked.sameBank, ranked.sameThrow, ranked.adjacentThrow],
          Math.round(ranked.collectorSpread * 1e7),
        ].map((key) => String(key).padStart(12, '0')),
      )
      expect(keys.map(String)).toEqual(keys.map(String).toSorted())
    }
  })

  it('judges an order by the choice of turns that an analysis takes', () => {
    const train = presetTrain('v8x-5000')
    for (const { order, intervals } of rankedFiringOrders(train, { even: false }).orders)
      firingOf({ ...train, firingOrder: order }).intervals.forEach((interval, place) =>
        expect(intervals[place]).toBeCloseTo(interval, 9),
      )
  })

  it('keeps the best of the whole list where it keeps only some', () => {
    const train = presetTrain('v8x-5000')
    const all = rankedFiringOrders(train, { even: false })
    const some = rankedFiringOrders(train, { even: false, keep: 7 })
    expect(all.found).toBeGreaterThan(7)
    expect(some).toEqual({ orders: all.orders.slice(0, 7), found: all.found, complete: true })
  })

  it('goes through all orders of 16 cylinders within 2 s of work, with a word now and then', () => {
    const search = rankFiringOrders(uneven(16), { even: false })
    const words: number[] = []
    const start = process.cpuUsage()
    let step = search.next()
    for (; !step.done; step = search.next()) words.push(step.value)
    expect(process.cpuUsage(start).user / 1000).toBeLessThan(2000)
    // the one order that fits into a single turn leaves the other turn to be spent at any of 16 places: one order of 16 choices
    expect(step.value).toMatchObject({ found: 2 ** 15 - 15, complete: true })
    expect(step.value.orders).toHaveLength(4096)
    expect(words.length).toBeGreaterThan(100)
    expect(words).toEqual(words.toSorted((a, b) => a - b))
  })

  it('stops where there are more even orders than it looks at, and says so', () => {
    const pins = Array.from({ length: 34 }, (_, k) => (720 - (720 * k) / 34) % 360)
    const { found, complete, orders } = rankedFiringOrders(trainOf(inline(pins)), { even: true, keep: 5 })
    expect([found, complete, orders.length]).toEqual([2 ** 15, false, 5])
  })

  it('has the one order of cylinders that can only fire at once', () => {
    const two = trainOf(inline([0, 0], { cycle: 'two-stroke', firingOrder: ['2', '1'] }))
    expect(rankedFiringOrders(two, { even: true }).orders).toEqual([])
    const { orders } = rankedFiringOrders(two, { even: false })
    expect(orders.map(({ order }) => order)).toEqual([[0, 1]])
    expect(orders[0].intervals.map((x) => x / DEG)).toEqual([0, 360])
    // three at one top dead centre of a four-stroke: two of them together
    const three = trainOf(inline([0, 0, 0]))
    const found = rankedFiringOrders(three, { even: false }).orders
    expect(found.map(({ order }) => order.join())).toEqual(['0,1,2', '0,2,1'])
    for (const { intervals } of found)
      expect(intervals.map((x) => Math.round(x / DEG)).toSorted((a, b) => a - b)).toEqual([0, 360, 360])
  })

  it('lists two cylinders of one pin a turn apart, though the document has them fire at once', () => {
    const document = inline([0, 0])
    document.cylinders.forEach((cylinder) => (cylinder.firesAtDeg = 0))
    const train = trainOf(document)
    const [only] = rankedFiringOrders(train, { even: true }).orders
    expect(only.intervals.map((x) => x / DEG)).toEqual([360, 360])
    const stated = train.cylinders.map(({ firesAt }) => firesAt)
    expect(rankOrder(train, train.firingOrder, stated).intervals.map((x) => x / DEG)).toEqual([0, 720])
  })
})
