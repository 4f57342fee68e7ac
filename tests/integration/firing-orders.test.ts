import { describe, expect, it } from 'vitest'
import {
  collectorsSchema,
  firingOrdersSchema,
  phasingSchema,
  type CollectorsAnswer,
  type FiringOrdersAnswer,
} from '@/lib/contracts/firing'
import type { Issue } from '@/scene/model/issue'
import { call } from './support/call'
import { preset } from './support/documents'
import { useServer } from './support/server'

useServer()

const post = (path: string, body: unknown) => call('POST', `/api/v1/${path}`, { body })
const issuesOf = (body: unknown) => (body as { issues: Issue[] }).issues
const inLine = (count: number) => ({
  ...preset('i4-2000'),
  throws: Array.from({ length: count }, (_, k) => ({
    id: `${k + 1}`,
    angleDeg: (k * 137.3) % 360,
    axialMm: 100 * k,
  })),
  cylinders: Array.from({ length: count }, (_, k) => ({
    id: `${k + 1}`,
    bank: 'A',
    throw: `${k + 1}`,
    axialMm: 100 * k,
  })),
  collectors: [],
  counterweights: [],
  balanceShafts: [],
  mains: [],
  firingOrder: Array.from({ length: count }, (_, k) => k)
    .sort((a, b) => ((360 - ((a * 137.3) % 360)) % 360) - ((360 - ((b * 137.3) % 360)) % 360))
    .map((k) => `${k + 1}`),
})

describe('POST /firing-orders', () => {
  it.each([
    ['i4-2000', 2],
    ['i6-3000', 4],
    ['v8x-5000', 8],
    ['v8f-4200', 8],
    ['v10-72-5000', 16],
    ['v12-60-6000', 32],
  ])('POST /firing-orders lists the even orders of %s: %i', async (name, count) => {
    const train = preset(name)
    const { status, body } = await post('firing-orders', { train })
    expect(status).toBe(200)
    const answer: FiringOrdersAnswer = firingOrdersSchema.parse(body)
    expect(answer).toEqual(body)
    expect([answer.orders.length, answer.found, answer.complete]).toEqual([count, count, true])
    const ids = train.cylinders.map(({ id }) => id)
    for (const { order, intervalsDeg } of answer.orders) {
      expect(order[0]).toBe(ids[0])
      expect(order.toSorted()).toEqual(ids.toSorted())
      for (const interval of intervalsDeg) expect(interval).toBeCloseTo(720 / ids.length, 1)
    }
    expect(new Set(answer.orders.map(({ order }) => order.join())).size).toBe(count)
  })

  it('POST /firing-orders lists uneven orders where it is asked to, all of 16 cylinders too', async () => {
    expect((await post('firing-orders', { train: preset('v2-45-1600') })).body).toEqual({
      orders: [],
      found: 0,
      complete: true,
    })
    const twin = await post('firing-orders', { train: preset('v2-45-1600'), even: false })
    const [only] = (twin.body as FiringOrdersAnswer).orders
    expect(only.order).toEqual(['1', '2'])
    expect(only.intervalsDeg.map((interval) => Math.round(interval))).toEqual([405, 315])
    const { body } = await post('firing-orders', { train: inLine(16), even: false })
    const { orders, found, complete } = body as FiringOrdersAnswer
    expect([orders.length, found, complete]).toEqual([4096, 2 ** 15 - 15, true])
  })

  it('POST /firing-orders refuses all orders of more than 16 cylinders, and a train that cannot fire', async () => {
    const many = await post('firing-orders', { train: inLine(17), even: false })
    expect(many.status).toBe(422)
    expect(issuesOf(many.body)[0]).toMatchObject({ path: 'even', code: 'too-many-cylinders' })
    const wrong = await post('firing-orders', {
      train: { ...preset('i4-2000'), firingOrder: ['1', '2', '3', '4'] },
    })
    expect(wrong.status).toBe(422)
    expect(issuesOf(wrong.body)[0]).toMatchObject({
      path: 'train.firingOrder',
      code: 'firing-order-impossible',
    })
    expect((await post('firing-orders', { train: preset('i4-2000'), even: 'yes' })).status).toBe(422)
  })
})

describe('POST /firing-orders/phasing', () => {
  it('POST /firing-orders/phasing proposes throws for an order, and the mirror', async () => {
    const { status, body } = await post('firing-orders/phasing', {
      train: preset('i3-1000'),
      order: ['1', '3', '2'],
    })
    expect(status).toBe(200)
    expect(phasingSchema.parse(body)).toEqual(body)
    const angles = (throws: { angleDeg: number }[]) => throws.map(({ angleDeg }) => angleDeg)
    const { proposal, mirror } = phasingSchema.parse(body)
    expect(angles(proposal.throws)).toEqual([0, 240, 120])
    expect(mirror?.order).toEqual(['1', '2', '3'])
    expect(angles(mirror!.throws)).toEqual([0, 120, 240])
  })

  it('POST /firing-orders/phasing refuses what no crank can do, with the field it is about', async () => {
    const train = preset('i4-2000')
    const paths = async (more: object) =>
      issuesOf((await post('firing-orders/phasing', { train, ...more })).body).map(({ path }) => path)
    expect(await paths({ order: ['1', '3', '3', '2'] })).toContain('order')
    expect(await paths({ order: ['1', '3', '4', '2'], intervalsDeg: [180, 180, 180, 160] })).toEqual([
      'intervalsDeg',
    ])
    expect(await paths({})).toEqual(['order'])
  })
})

describe('POST /collectors', () => {
  it('POST /collectors leads the cross-plane V8 as {1,4,6,7} and {2,3,5,8}', async () => {
    const { status, body } = await post('collectors', { train: preset('v8x-5000'), count: 2 })
    expect(status).toBe(200)
    const answer: CollectorsAnswer = collectorsSchema.parse(body)
    expect(answer).toEqual(body)
    const [best] = answer.groupings
    expect(best.groups.map(({ cylinders }) => cylinders.toSorted().join()).toSorted()).toEqual([
      '1,4,6,7',
      '2,3,5,8',
    ])
    for (const { intervalsDeg, pulses } of best.groups) {
      for (const interval of intervalsDeg) expect(interval).toBeCloseTo(180, 9)
      for (const { gapDeg, overlapDeg } of pulses) {
        expect(gapDeg).toBeCloseTo(180, 9)
        expect(overlapDeg).toBe(0)
      }
    }
    expect(answer.window.opensDeg).toBeCloseTo(135, 9)
    expect(answer.window.lengthDeg).toBeCloseTo(42, 9)
  })

  it('POST /collectors takes a window of blow-down as asked', async () => {
    const { body } = await post('collectors', {
      train: preset('i4-2000'),
      count: 1,
      exhaustOpensDeg: 120,
      windowDeg: 200,
    })
    const { window, groupings } = body as CollectorsAnswer
    expect(window.opensDeg).toBeCloseTo(120, 9)
    // 180° apart, 200° long: 20° shared with the one before and 20° with the one after
    for (const { overlapDeg } of groupings[0].groups[0].pulses) expect(overlapDeg).toBeCloseTo(40, 9)
  })

  it('POST /collectors refuses more collectors than cylinders, none, and a window beyond the cycle', async () => {
    const paths = async (body: object) =>
      issuesOf((await post('collectors', body)).body).map(({ path }) => path)
    expect(await paths({ train: preset('i3-1000'), count: 4 })).toEqual(['count'])
    expect(await paths({ train: preset('i3-1000'), count: 0 })).toEqual(['count'])
    expect(
      await paths({ train: preset('m6-2t-520'), count: 2, exhaustOpensDeg: 400, windowDeg: 361 }),
    ).toEqual(['exhaustOpensDeg', 'windowDeg'])
  })
})
