import { describe, expect, it } from 'vitest'
import { firingOf } from '@/lib/mechanics/firing'
import { rankedFiringOrders } from '@/lib/mechanics/firing-ranking'
import { firingTurns } from '@/lib/mechanics/firing-turns'
import { DEG, presetDocument, presetTrain, trainOf } from './trains'

const square = (intervals: readonly number[]) => intervals.reduce((sum, interval) => sum + interval ** 2, 0)
const degrees = (angles: readonly number[]) => angles.map((angle) => Math.round(angle / DEG))

describe('firingTurns(train, order)', () => {
  it('has 405-315 and 45-675 for a 45° twin on one pin, the more even first', () => {
    expect(firingTurns(presetTrain('v2-45-1600'), [0, 1]).map(({ intervals }) => degrees(intervals))).toEqual(
      [
        [405, 315],
        [45, 675],
      ],
    )
  })

  it('has what an analysis takes among the most even, for every order', () => {
    for (const id of ['v8x-5000', 'i4x-1000', 'r7-11', 'm6-2t-520', 'single-450']) {
      const train = presetTrain(id)
      for (const { order, intervals } of rankedFiringOrders(train, { even: false }).orders) {
        const ways = firingTurns(train, order)
        const same = ways.filter((way) =>
          way.intervals.every((own, at) => Math.abs(own - intervals[at]) < 1e-9),
        )
        expect(same).toHaveLength(1)
        expect(square(same[0].intervals)).toBeCloseTo(square(ways[0].intervals), 6)
      }
    }
  })

  it('gives angles that a document may state, and that then fire so', () => {
    const document = presetDocument('r7-11')
    const order = [0, 1, 2, 3, 4, 5, 6]
    const ways = firingTurns(trainOf(document), order)
    expect(ways).toHaveLength(7)
    for (const { angles, intervals } of ways) {
      const cylinders = document.cylinders.map((cylinder, index) => ({
        ...cylinder,
        firesAtDeg: angles[order.indexOf(index)] / DEG,
      }))
      const stated = trainOf({
        ...document,
        cylinders,
        firingOrder: order.map((one) => document.cylinders[one].id),
      })
      const fired = firingOf(stated).intervals
      fired.forEach((interval, place) => expect(interval).toBeCloseTo(intervals[place], 6))
    }
  })

  it('has one way where the order leaves no turn over, and none for an order that cannot be', () => {
    expect(firingTurns(presetTrain('v8x-5000'), presetTrain('v8x-5000').firingOrder)).toHaveLength(1)
    expect(firingTurns(presetTrain('i4-2000'), [0, 1, 2, 3])).toEqual([])
  })
})
