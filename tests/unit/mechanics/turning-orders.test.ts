import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { orderStar, torqueOrders } from '@/lib/mechanics/loads/torque-orders'
import { torqueSignal } from '@/lib/mechanics/loads/turning-moment'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset, presetIds, ratedRpm } from '@/tests/support/mechanics/presets'
import { RPM } from './trains'

describe('torqueOrders(torque, cycle)', () => {
  it('finds the size and phase of the waves that were put in, half orders too, and nothing else', () => {
    const cycle = 4 * Math.PI
    const torque = Array.from({ length: 720 }, (_, j) => {
      const angle = (cycle * j) / 720
      return 7 + 3 * Math.cos(1.5 * angle - 0.4) + 5 * Math.cos(12 * angle + 2)
    })
    const orders = torqueOrders(torque, cycle)
    expect(orders.map(({ order }) => order)).toEqual(Array.from({ length: 24 }, (_, k) => (k + 1) / 2))
    for (const { order, amplitude, phase } of orders) {
      expect(amplitude).toBeCloseTo(order === 1.5 ? 3 : order === 12 ? 5 : 0, 9)
      if (order === 1.5) expect(phase).toBeCloseTo(0.4, 9)
      if (order === 12) expect(phase).toBeCloseTo(-2, 9)
    }
  })

  it('of a two-stroke are whole orders only', () => {
    const orders = torqueOrders(new Float64Array(360).fill(1), 2 * Math.PI)
    expect(orders.map(({ order }) => order)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12])
  })

  it.each(presetIds)('of %s are those of the analysis', (id) => {
    const train = trainOf(preset(id))
    const speed = ratedRpm(preset(id)) * RPM
    const { orders } = analyse(train, { speed, include: ['orders'] })
    const torque = torqueSignal(cycleParts(train), 'total', speed)
    const top = Math.max(...orders!.map(({ torqueNm }) => torqueNm))
    torqueOrders(torque, train.cycle).forEach(({ order, amplitude }, k) => {
      expect(order).toBe(orders![k].order)
      expect(Math.abs(amplitude - orders![k].torqueNm) / top).toBeLessThan(1e-9)
    })
  })
})

describe('orderStar(fires, order)', () => {
  const majors = (id: string) => {
    const { fires, train } = cycleParts(trainOf(preset(id)), 90).plan
    const turns = train.cycle / (2 * Math.PI)
    return Array.from({ length: 12 * turns }, (_, k) => (k + 1) / turns).filter(
      (order) => orderStar(fires, order).major,
    )
  }

  // an evenly firing engine's major orders are multiples of its firings a turn (common practice)
  it.each([
    ['i3-1000', [1.5, 3, 4.5, 6, 7.5, 9, 10.5, 12]],
    ['i4-2000', [2, 4, 6, 8, 10, 12]],
    ['i5-2500', [2.5, 5, 7.5, 10]],
    ['i6-3000', [3, 6, 9, 12]],
    ['v8x-5000', [4, 8, 12]],
    ['v8f-4200', [4, 8, 12]],
    ['v12-60-6000', [6, 12]],
    ['m6-2t-520', [6, 12]],
    // its link rods put the firings up to 4° off an even beat
    ['r7-11', [3.5]],
  ])('flags the major orders of %s', (id, wanted) => {
    expect(majors(id)).toEqual(wanted)
  })

  it('of a twin on one pin, 315° and 405° apart, flags the orders that bring 315° near whole turns', () => {
    // 3.5 × 315° = 3 turns + 22.5°, 4.5 × 315° = 4 turns − 22.5°, 8 × 315° = 7 turns, 11.5 × 315° = 10 turns + 22.5°
    expect(majors('v2-45-1600')).toEqual([3.5, 4.5, 8, 11.5])
  })

  it('adds up to nothing for an order that an even four leaves out, and to four where it is major', () => {
    const { fires } = cycleParts(trainOf(preset('i4-2000')), 90).plan
    const size = (order: number) => {
      const { sum } = orderStar(fires, order)
      return Math.hypot(sum.re, sum.im)
    }
    expect(size(0.5)).toBeCloseTo(0, 9)
    expect(size(1)).toBeCloseTo(0, 9)
    expect(size(2)).toBeCloseTo(4, 9)
  })

  it('times the first cylinder’s own wave is the wave of all equal cylinders', () => {
    const parts = cycleParts(trainOf(preset('i4-2000')))
    const { train, plan } = parts
    const first = torqueOrders(torqueSignal(parts, 'gas', 0, [0]), train.cycle)
    const all = torqueOrders(torqueSignal(parts, 'gas', 0), train.cycle)
    all.forEach(({ order, amplitude }, k) => {
      const { sum } = orderStar(plan.fires, order)
      expect(amplitude / first[k].amplitude).toBeCloseTo(Math.hypot(sum.re, sum.im), 3)
    })
  })

  it('with lengths adds up unequal cylinders', () => {
    const { sum, major } = orderStar([0, Math.PI], 2, [3, 1])
    expect(sum.re).toBeCloseTo(4, 12)
    expect(major).toBe(true)
    expect(orderStar([0, Math.PI], 1, [3, 1])).toMatchObject({ major: false })
    expect(orderStar([0, Math.PI], 1, [3, 1]).sum.re).toBeCloseTo(2, 12)
  })
})
