import { describe, expect, it } from 'vitest'
import { collectorChanges, orderChanges } from '@/components/firing/edits'
import { bunched, orderName, orderTable, turnedTo, whyNoneEven } from '@/components/firing/order-words'
import { laneGroups, pulseSentence, pulseTable, spreadWords } from '@/components/firing/pulse-words'
import { wholeSpans } from '@/components/firing/window-spans'
import { exhaustPulses } from '@/lib/mechanics/exhaust-pulses'
import { rankedFiringOrders, rankOrder } from '@/lib/mechanics/firing-ranking'
import { createSession } from '@/scene/session/session'
import { defaultView } from '@/scene/model/default-scene'
import { DEG, inline, presetDocument, presetTrain, trainOf } from '../mechanics/trains'

describe('orders in words', () => {
  it('turns an order so that it begins as the present one does, with its intervals', () => {
    const train = presetTrain('v8x-5000')
    const [best] = rankedFiringOrders(train, { even: false }).orders
    const turned = turnedTo(best, train.firingOrder[0])
    expect(orderName(train, turned).startsWith('1-')).toBe(true)
    const at = best.order.indexOf(turned.order[0])
    expect(turned.intervals[0]).toBe(best.intervals[at])
  })

  it('marks the present order in the table', () => {
    const train = presetTrain('i6-3000')
    const orders = rankedFiringOrders(train, { even: true }).orders
    const { rows } = orderTable(train, orders, '1-5-3-6-2-4')
    expect(rows.map((row) => [row[0], row.at(-1)])).toContainEqual(['1-5-3-6-2-4', 'present'])
    expect(rows.filter((row) => row.at(-1) === 'present')).toHaveLength(1)
  })

  it('says why a single row of an even count cannot fire evenly', () => {
    const star = inline([0], {
      banks: [0, 90, 180, 270].map((angleDeg, index) => ({ id: 'ABCD'[index], angleDeg })),
      cylinders: [0, 1, 2, 3].map((index) => ({
        id: `${index + 1}`,
        bank: 'ABCD'[index],
        throw: '1',
        axialMm: index,
      })),
      firingOrder: ['1', '2', '3', '4'],
    })
    const train = trainOf(star)
    expect(rankedFiringOrders(train, { even: true }).found).toBe(0)
    expect(whyNoneEven(train)).toContain('single row with 4 cylinders cannot fire evenly')
    expect(whyNoneEven(presetTrain('v2-45-1600'))).not.toContain('single row')
    expect(bunched(rankOrder(train, train.firingOrder))).toContain('then pause 450°')
    expect(bunched(rankOrder(presetTrain('i4-2000'), [0, 2, 3, 1]))).toBeNull()
  })

  it('takes an order as one step, and stated firing angles with it', () => {
    const train = presetDocument('v2-45-1600')
    train.cylinders[1].firesAtDeg = 405
    const changes = orderChanges(train, ['1', '2'])
    expect(changes.map(({ path }) => path.join('.'))).toEqual([
      'train.firingOrder',
      'train.cylinders.1.firesAtDeg',
    ])
  })

  it('takes a grouping as one step that undo brings back', () => {
    const train = presetDocument('v8x-5000')
    const scene = { format: 'scene/1' as const, train, view: defaultView(train) }
    const session = createSession({ scene })
    const groups = [
      ['1', '4', '6', '7'],
      ['8', '3', '5', '2'],
    ]
    expect(session.edit(collectorChanges(groups))).toBe(true)
    expect(session.getState().scene.train.collectors).toEqual([
      { id: 'A', cylinders: groups[0] },
      { id: 'B', cylinders: groups[1] },
    ])
    expect(session.getState().past).toHaveLength(1)
    session.undo()
    expect(session.getState().scene.train.collectors).toEqual(scene.train.collectors)
  })
})

describe('pulses in words', () => {
  it('says the gaps, the overlaps and who is worst placed', () => {
    const train = presetTrain('v8x-5000')
    const lanes = laneGroups(train, exhaustPulses(train, { opens: 135 * DEG, length: 120 * DEG }), false)
    expect(pulseSentence(lanes)).toMatch(/^4 of 8 pulses overlap another of their collector/)
    expect(spreadWords(lanes[0])).toContain('gaps differ by 180°, overlaps by 30°')
    const short = laneGroups(train, exhaustPulses(train, { opens: 135 * DEG, length: 42 * DEG }), false)
    expect(pulseSentence(short)).toBe('No two pulses of one collector overlap.')
  })

  it('has gaps in milliseconds at the speed beside those in degrees', () => {
    const train = presetTrain('i4-2000')
    const { rows, columns } = pulseTable(
      laneGroups(train, exhaustPulses(train, { opens: 2, length: 1 }), false),
      6000,
    )
    const at = columns.findIndex(({ unit }) => unit === 'ms')
    // half a turn at 100 turns a second
    for (const row of rows) expect(row[at]).toBeCloseTo(5, 9)
  })

  it('has words for one cylinder by itself', () => {
    const train = presetTrain('single-450')
    const [lane] = laneGroups(train, exhaustPulses(train, { opens: 2, length: 1 }), false)
    expect(spreadWords(lane)).toBe('Collector A: cylinder 1 alone.')
  })
})

describe('wholeSpans(opens, others, length, cycle)', () => {
  it('cuts a window where the cycle ends', () => {
    expect(wholeSpans(700, [], 60, 720)).toEqual({
      own: [
        { from: 700, to: 720 },
        { from: 0, to: 40 },
      ],
      shared: [],
    })
  })

  it('gives as much shared as the kernel counts', () => {
    for (const [id, length] of [
      ['v8x-5000', 120],
      ['i4x-1000', 300],
      ['i6-3000', 700],
    ] as const) {
      const train = presetTrain(id)
      for (const { pulses } of exhaustPulses(train, { opens: 135 * DEG, length: length * DEG }))
        pulses.forEach(({ opens, overlap }, place) => {
          const others = pulses.filter((_, index) => index !== place).map((pulse) => pulse.opens / DEG)
          const { shared } = wholeSpans(opens / DEG, others, length, train.cycle / DEG)
          const sum = shared.reduce((all, { from, to }) => all + to - from, 0)
          expect(sum).toBeCloseTo(overlap / DEG, 6)
        })
    }
  })
})
