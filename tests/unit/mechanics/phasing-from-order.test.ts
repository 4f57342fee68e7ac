import { describe, expect, it } from 'vitest'
import { firingOf } from '@/lib/mechanics/firing'
import { mirroredOrder, phasingFromOrder } from '@/lib/mechanics/phasing-from-order'
import { rankedFiringOrders } from '@/lib/mechanics/firing-ranking'
import { presets } from '@/scene/model/presets'
import { DEG, inline, presetTrain, trainOf } from './trains'

const pins = (count: number) => Array.from({ length: count }, (_, k) => (360 - (720 * k) / count + 720) % 360)
const degrees = (angles: readonly number[]) => angles.map((angle) => Math.round((angle / DEG) * 1e6) / 1e6)
const turned = (train: ReturnType<typeof trainOf>, angles: number[], firingOrder: number[]) => ({
  ...train,
  throws: train.throws.map((pin, index) => ({ ...pin, angle: angles[index] })),
  firingOrder,
})

describe('phasingFromOrder(train, order)', () => {
  it('puts the pins of three in line at −F: 0, 240, 120 for 1-3-2, and 0, 120, 240 for its mirror', () => {
    const train = trainOf(inline(pins(3)))
    const order = [0, 2, 1]
    const own = phasingFromOrder(train, order)
    const mirror = phasingFromOrder(train, mirroredOrder(order))
    expect(own.ok && degrees(own.throwAngles)).toEqual([0, 240, 120])
    expect(mirror.ok && degrees(mirror.throwAngles)).toEqual([0, 120, 240])
    expect(mirroredOrder(order)).toEqual([0, 1, 2])
  })

  it.each(presets.map(({ id }) => id))('%s: its own order asks for its own throws', (id) => {
    const train = presetTrain(id)
    const { intervals } = firingOf(train)
    const phasing = phasingFromOrder(train, train.firingOrder, intervals)
    expect(phasing.ok).toBe(true)
    if (phasing.ok)
      phasing.throwAngles.forEach((angle, index) =>
        expect(Math.cos(angle - train.throws[index].angle)).toBeCloseTo(1, 5),
      )
  })

  it('makes any order of a throw a cylinder even, with banks and offsets too', () => {
    for (const id of ['i6-3000', 'i4-2000', 'b6-3400', 'v6-90s-3200', 'm6-2t-520']) {
      const train = presetTrain(id)
      for (const order of [
        train.cylinders.map((_, index) => index),
        [0, ...train.cylinders.slice(1).map((_, index) => train.cylinders.length - 1 - index)],
      ]) {
        const phasing = phasingFromOrder(train, order)
        expect(phasing.ok, id).toBe(true)
        if (!phasing.ok) continue
        expect(firingOf(turned(train, phasing.throwAngles, order)).even, `${id} ${order}`).toBe(true)
        expect(phasing.throwAngles[train.cylinders[0].throw]).toBeCloseTo(
          train.throws[train.cylinders[0].throw].angle,
          9,
        )
      }
    }
  })

  it('takes every even order of the cross-plane V8 on its shared pins, and names the two that a pin cannot serve', () => {
    const train = presetTrain('v8x-5000')
    for (const { order } of rankedFiringOrders(train, { even: true }).orders)
      expect(phasingFromOrder(train, order).ok).toBe(true)
    // 1 and 2 share a pin on banks 90° apart: firing 180° apart they would need it in two places
    const phasing = phasingFromOrder(train, [0, 2, 1, 3, 4, 5, 6, 7])
    expect(phasing.ok).toBe(false)
    if (!phasing.ok) expect(phasing.cylinders).toEqual([0, 1])
  })

  it('finds the 30° by which the pins of an even 90° V6 must be split', () => {
    const throws = [0, 120, 240].map((angleDeg, index) => ({
      id: `${index + 1}`,
      angleDeg,
      axialMm: 100 * index,
    }))
    const cylinders = [0, 1, 2, 3, 4, 5].map((index) => ({
      id: `${index + 1}`,
      bank: 'AB'[index % 2],
      throw: `${(index >> 1) + 1}`,
      axialMm: 50 * index,
    }))
    const banks = [
      { id: 'A', angleDeg: -45 },
      { id: 'B', angleDeg: 45 },
    ]
    const order = ['1', '2', '5', '6', '3', '4']
    const train = trainOf(inline([], { banks, throws, cylinders, firingOrder: order }))
    const phasing = phasingFromOrder(
      train,
      order.map((id) => Number(id) - 1),
    )
    expect(phasing).toMatchObject({ ok: false, throw: 0, cylinders: [0, 1] })
    if (!phasing.ok) expect(phasing.apart / DEG).toBeCloseTo(30, 6)
  })

  it('leaves a throw without cylinders where it is', () => {
    const document = inline([0, 180])
    const train = trainOf({
      ...document,
      throws: [...document.throws, { id: 'spare', angleDeg: 33, axialMm: 300 }],
    })
    const phasing = phasingFromOrder(train, [0, 1])
    expect(phasing.ok && degrees(phasing.throwAngles)).toEqual([0, 0, 33])
  })
})
