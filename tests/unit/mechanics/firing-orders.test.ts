import { describe, expect, it } from 'vitest'
import { firingOf } from '@/lib/mechanics/firing'
import { legalFiringOrders } from '@/lib/mechanics/firing-orders'
import { inline, presetTrain, trainOf } from './trains'

const orders = (id: string, even: boolean) => [...legalFiringOrders(presetTrain(id), { even })]
const ids = (id: string, order: number[]) =>
  order.map((cylinder) => presetTrain(id).cylinders[cylinder].id).join('-')

describe('legalFiringOrders(train, { even })', () => {
  it.each([
    // number of even orders: common practice
    ['i4-2000', 2],
    ['i6-3000', 4],
    ['b6-3400', 4],
    ['v8x-5000', 8],
    ['v8f-4200', 8],
    ['v10-72-5000', 16],
    ['v12-60-6000', 32],
    ['i5-2500', 1],
    ['m6-2t-520', 1],
    ['single-450', 1],
  ])('%s has %i even orders', (id, count) => {
    expect(orders(id, true)).toHaveLength(count)
  })

  it('lists the orders of a flat-plane four', () => {
    expect(orders('i4-2000', true).map((order) => ids('i4-2000', order))).toEqual(['1-2-4-3', '1-3-4-2'])
    expect(orders('i4-2000', false)).toEqual(orders('i4-2000', true))
  })

  it.each(['v2-45-1600', 'i4x-1000', 'v8x-5000'])(
    'every order of %s is one the crank allows, each once',
    (id) => {
      const train = presetTrain(id)
      const all = orders(id, false)
      expect(new Set(all.map(String)).size).toBe(all.length)
      for (const firingOrder of all) {
        expect(firingOrder[0]).toBe(0)
        expect(firingOf({ ...train, firingOrder }).events).toHaveLength(train.cylinders.length)
      }
      for (const firingOrder of orders(id, true)) {
        expect(firingOf({ ...train, firingOrder }).even).toBe(true)
        expect(all).toContainEqual(firingOrder)
      }
    },
  )

  it('answers at once where 64 cylinders have many even orders, or just miss having one', () => {
    const pins = Array.from({ length: 64 }, (_, k) => (720 - (720 * k) / 64) % 360)
    const [first] = legalFiringOrders(trainOf(inline(pins)), { even: true })
    expect(first.slice(0, 3)).toEqual([0, 1, 2])
    const off = trainOf(inline(pins.map((pin, k) => (k === 63 ? pin + 5 : pin))))
    expect([...legalFiringOrders(off, { even: true })]).toEqual([])
  })

  it('finds as many orders as going through all permutations does', () => {
    const train = trainOf(inline([0, 270, 90, 180], { firingOrder: ['1', '3', '2', '4'] }))
    const permutations = (rest: number[]): number[][] =>
      rest.length === 0
        ? [[]]
        : rest.flatMap((one) => permutations(rest.filter((x) => x !== one)).map((p) => [one, ...p]))
    const possible = permutations([1, 2, 3])
      .map((rest) => [0, ...rest])
      .filter((firingOrder) => {
        try {
          return firingOf({ ...train, firingOrder }).events.length === 4
        } catch {
          return false
        }
      })
    const found = [...legalFiringOrders(train, { even: false })]
    expect(found.map(String).toSorted()).toEqual(possible.map(String).toSorted())
  })
})
