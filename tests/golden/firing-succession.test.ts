import { describe, expect, it } from 'vitest'
import { rankedFiringOrders, rankOrder } from '@/lib/mechanics/firing-ranking'
import { presets } from '@/scene/model/presets'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset } from '@/tests/support/mechanics/presets'

// Numbers of orders and counts of successions: common practice.

const rankedOf = (id: string, even: boolean) => {
  const train = trainOf(preset(id))
  const fromOne = (names: string[]) => [
    ...names.slice(names.indexOf('1')),
    ...names.slice(0, names.indexOf('1')),
  ]
  return rankedFiringOrders(train, { even }).orders.map((ranked) => ({
    ...ranked,
    name: fromOne(ranked.order.map((cylinder) => train.cylinders[cylinder].id)).join('-'),
    sameOrAdjacent: ranked.sameThrow + ranked.adjacentThrow,
  }))
}

describe('rankedFiringOrders(train, { even }): common practice', () => {
  it.each([
    ['i4-2000', 2],
    ['i6-3000', 4],
    ['v8x-5000', 8],
    ['v8f-4200', 8],
    ['v10-72-5000', 16],
    ['v12-60-6000', 32],
  ])('%s has %i even orders', (id, count) => {
    expect(rankedOf(id, true)).toHaveLength(count)
  })

  it.each([
    ['single-450', 1],
    ['single-125-2t', 1],
    ['p2-270-700', 1],
    ['v2-45-1600', 1],
    ['v2-90-1000', 1],
    ['i3-1000', 1],
    ['i4x-1000', 4],
    ['i5-2500', 1],
    ['m6-2t-520', 1],
    ['b4-2000', 2],
    ['b6-3400', 4],
    ['v6-60-3000', 4],
    ['v6-90s-3200', 4],
    ['r7-11', 1],
  ])('%s has %i orders as even as its own', (id, count) => {
    const train = trainOf(preset(id))
    const own = rankOrder(train, train.firingOrder)
    const orders = rankedOf(id, false)
    expect(orders.filter(({ spread }) => spread < own.spread + 0.017)).toHaveLength(count)
    // and none is more even
    expect(orders[0].spread).toBeGreaterThan(own.spread - 0.017)
  })

  it('in-line six: 1-5-3-6-2-4 has no two firings in a row on one or neighbouring throws, the others 2 to 4', () => {
    const [first, ...others] = rankedOf('i6-3000', true)
    expect([first.name, first.sameOrAdjacent]).toEqual(['1-5-3-6-2-4', 0])
    expect(others.map(({ sameOrAdjacent }) => sameOrAdjacent)).toEqual([2, 2, 4])
  })

  it('cross-plane V8: 1-8-4-3-6-5-7-2 and 1-8-7-2-6-5-4-3 tie at 2 on one bank, 3 on one throw, 5 on one or neighbours', () => {
    const orders = rankedOf('v8x-5000', true)
    for (const name of ['1-8-4-3-6-5-7-2', '1-8-7-2-6-5-4-3']) {
      const found = orders.find((order) => order.name === name)!
      expect([found.sameBank, found.sameThrow, found.sameOrAdjacent], name).toEqual([2, 3, 5])
    }
  })

  it.each(presets.map(({ id }) => id))('the order of %s is on its own list, with its intervals', (id) => {
    const train = trainOf(preset(id))
    const own = rankOrder(train, train.firingOrder)
    const first = train.firingOrder.indexOf(0)
    const turned = [...train.firingOrder.slice(first), ...train.firingOrder.slice(0, first)]
    const found = rankedFiringOrders(train, { even: false }).orders.find(
      ({ order }) => order.join() === turned.join(),
    )!
    expect(found.spread).toBeCloseTo(own.spread, 9)
    expect(found.sameBank).toBe(own.sameBank)
    expect(found.intervals.reduce((sum, interval) => sum + interval, 0)).toBeCloseTo(train.cycle, 9)
  })
})
