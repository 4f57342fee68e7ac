import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { inertiaScale } from '@/lib/mechanics/balance/inertia-scale'
import { reciprocatingAlone, textbookOrders } from '@/lib/mechanics/balance/textbook-orders'
import { bare, exactOrders, turningOrders, type Turning } from '@/lib/mechanics/balance/turning'
import type { Train } from '@/lib/mechanics/train'
import { layout } from '@/tests/support/mechanics/layout'
import { layouts } from '@/tests/support/mechanics/layouts'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset, presetIds } from '@/tests/support/mechanics/presets'

/**
 * Free forces and couples of equal cylinders by order, "long half axis/short (forward/backward)", in units of F1 = m·r·ω²
 * and F2 = λ·F1 and of these times the throw spacing: common practice, handbook coefficients.
 * Order-1 force, order-1 couple, order-2 force, order-2 couple; a dash where one throw makes no couple.
 */
const table: Record<string, [string, string, string, string]> = {
  Single: ['1 (0.5/0.5)', '-', '1 (0.5/0.5)', '-'],
  'I2 360': ['2 (1/1)', '0', '2 (1/1)', '0'],
  'I2 180': ['0', '1 (0.5/0.5)', '2 (1/1)', '0'],
  'I2 270': ['1.414 (0.707/0.707)', '0.707 (0.354/0.354)', '0', '1 (0.5/0.5)'],
  'I3 120': ['0', '1.732 (0.866/0.866)', '0', '1.732 (0.866/0.866)'],
  'I4 0-180-180-0': ['0', '0', '4 (2/2)', '0'],
  'I4 0-270-90-180': ['0', '3.162 (1.581/1.581)', '0', '0'],
  'I4 0-180-270-90': ['0', '1.414', '0', '4'],
  'I5 1-2-4-5-3': ['0', '0.449 (0.225/0.225)', '0', '4.980 (2.490/2.490)'],
  'I6 1-5-3-6-2-4': ['0', '0', '0', '0'],
  'I8 0-180-90-270-270-90-180-0': ['0', '0', '0', '0'],
  'two-stroke I3 1-3-2': ['0', '1.732', '0', '1.732'],
  'two-stroke I4 1-3-2-4': ['0', '1.414', '0', '4'],
  'two-stroke I5 1-4-3-2-5': ['0', '0.449', '0', '4.980'],
  'two-stroke I6 1-5-3-4-2-6': ['0', '0', '0', '3.464'],
  'two-stroke I7 1-7-2-5-4-3-6': ['0', '0.267', '0', '1.006'],
  'two-stroke I8 1-8-3-4-7-2-5-6': ['0', '0.897', '0', '0'],
  'V2 45 common': ['1.707/0.293 (1/0.707)', '-', '1.307/0.541 (0.924/0.383)', '-'],
  'V2 60 common': ['1.5/0.5 (1/0.5)', '-', '0.866/0.866 (0.866/0)', '-'],
  'V2 90 common': ['1/1 (1/0)', '-', '1.414/0 (0.707/0.707)', '-'],
  'V4 90 flat': ['0', '1/1 (1/0)', '2.828 (1.414/1.414)', '0'],
  'V6 60 six-throw': ['0', '1.5/1.5 (1.5/0)', '0', '1.5/1.5 (0/1.5)'],
  'V6 90 common': ['0', '1.732/1.732 (1.732/0)', '0', '2.449 (1.225/1.225)'],
  'V6 90 split 30': ['0', '2.121/1.225 (1.673/0.448)', '0', '2.121/1.225 (0.448/1.673)'],
  'V6 120 common': ['0', '2.598/0.866 (1.732/0.866)', '0', '2.598/0.866 (0.866/1.732)'],
  'V8 90 cross': ['0', '3.162/3.162 (3.162/0)', '0', '0'],
  'V8 90 flat': ['0', '0', '5.657 (2.828/2.828)', '0'],
  'V8 60 flat': ['0', '0', '3.464/3.464 (3.464/0)', '0'],
  'V10 72 common': ['0', '0.588/0.310 (0.449/0.139)', '0', '5.568/2.490 (4.029/1.539)'],
  'V10 90 common': ['0', '0.449/0.449 (0.449/0)', '0', '7.042 (3.521/3.521)'],
  'V12 60 common': ['0', '0', '0', '0'],
  'V12 90 common': ['0', '0', '0', '0'],
  'Boxer 2': ['0', '1 (0.5/0.5)', '0', '1 (0.5/0.5)'],
  'Boxer 4': ['0', '0', '0', '2 (1/1)'],
  'Boxer 6': ['0', '0', '0', '0'],
  'Radial 3': ['1.5/1.5 (1.5/0)', '-', '1.5/1.5 (0/1.5)', '-'],
  'Radial 5': ['2.5/2.5 (2.5/0)', '-', '0', '-'],
  'Radial 7': ['3.5/3.5 (3.5/0)', '-', '0', '-'],
  'Radial 9': ['4.5/4.5 (4.5/0)', '-', '0', '-'],
}

function expectCell(name: string, got: Turning, unit: number, cell: string) {
  if (cell === '-') return
  const [axes, parts] = cell.replace(')', '').split(' (')
  const near = (what: string, actual: number, printed: string) =>
    expect(Math.abs(actual / unit - Number(printed)), `${name}, ${what}: ${actual / unit}`).toBeLessThan(1e-3)
  const [major, minor] = axes.split('/')
  near('long axis', got.major, major)
  if (minor) near('short axis', got.minor, minor)
  if (!parts) return
  const [forward, backward] = parts.split('/')
  near('forward', got.forward.size, forward)
  near('backward', got.backward.size, backward)
}

const PITCH = 0.1

describe('textbookOrders(train), exactOrders(train): the table of layouts (common practice)', () => {
  it('has a row for every layout', () => {
    expect(Object.keys(table).sort()).toEqual(Object.keys(layouts).sort())
  })

  it.each(Object.entries(table))('%s', (name, [force1, couple1, force2, couple2]) => {
    const train = reciprocatingAlone(trainOf(layout(layouts[name].places)))
    const { force: f1, ratio } = inertiaScale(train)
    const textbook = textbookOrders(train)
    expectCell('order 1 force', textbook[0].force, f1, force1)
    expectCell('order 1 couple', textbook[0].couple, f1 * PITCH, couple1)
    expectCell('order 2 force', textbook[1].force, f1 * ratio, force2)
    expectCell('order 2 couple', textbook[1].couple, f1 * ratio * PITCH, couple2)
    // The exact motion has the same pattern; its second order is larger by A2/λ = 1 + λ²/4 + 15λ⁴/128 + …
    const exact = exactOrders(train)
    const more = 1 + ratio ** 2 / 4 + (15 * ratio ** 4) / 128
    expectCell('exact order 1 force', exact[0].force, f1, force1)
    expectCell('exact order 1 couple', exact[0].couple, f1 * PITCH, couple1)
    expectCell('exact order 2 force', exact[1].force, f1 * ratio * more, force2)
    expectCell('exact order 2 couple', exact[1].couple, f1 * ratio * more * PITCH, couple2)
  })

  it('the layouts are alike for the units of the table, with the spacing of their throws', () => {
    const scale = inertiaScale(trainOf(layout(layouts['I4 0-180-180-0'].places)))
    expect(scale).toEqual({
      force: expect.closeTo(0.5 * 0.04, 9),
      ratio: 0.25,
      spacing: expect.closeTo(PITCH, 12),
      alike: true,
    })
    expect(inertiaScale(trainOf(layout(layouts.Single.places))).spacing).toBeNull()
  })

  it('the fourth and sixth order of a single are λ³/4 and 9λ⁵/128 in the first term', () => {
    const train = reciprocatingAlone(trainOf(layout(layouts.Single.places)))
    const { force, ratio } = inertiaScale(train)
    const [, , fourth, sixth] = textbookOrders(train)
    expect(fourth.force.major / force).toBeCloseTo(ratio ** 3 / 4, 9)
    expect(sixth.force.major / force).toBeCloseTo((9 * ratio ** 5) / 128, 9)
    const exact = exactOrders(train)
    // λ³/4 + 3λ⁵/16 of the longer series
    expect(exact[2].force.major / force).toBeCloseTo(ratio ** 3 / 4 + (3 * ratio ** 5) / 16, 4)
    expect(exact[3].force.major / force).toBeCloseTo((9 * ratio ** 5) / 128, 4)
  })
})

describe('exactOrders(train) and textbookOrders(train) of whole engines', () => {
  const plain = (train: Train): Train => ({
    ...train,
    cylinders: train.cylinders.map((cylinder) => ({
      ...cylinder,
      offset: 0,
      link: undefined,
      rod: {
        ...cylinder.rod,
        rigid: false,
        inertia:
          cylinder.rod.mass * cylinder.rod.cgFromBigEnd * (cylinder.rodLength - cylinder.rod.cgFromBigEnd),
      },
    })),
  })

  it.each(presetIds)(
    '%s: without offsets and links the first order is the same in both, phases too',
    (id) => {
      const train = plain(trainOf(preset(id)))
      for (const of of [train, bare(train)]) {
        const [exact, textbook] = [exactOrders(of)[0], textbookOrders(of)[0]]
        const { force, spacing } = inertiaScale(train)
        for (const kind of ['force', 'couple'] as const) {
          const unit = kind === 'force' ? force : force * (spacing ?? train.cylinders[0].bore)
          for (const sense of ['forward', 'backward'] as const) {
            const [a, b] = [exact[kind][sense], textbook[kind][sense]]
            const off = Math.hypot(
              a.size * Math.cos(a.angle) - b.size * Math.cos(b.angle),
              a.size * Math.sin(a.angle) - b.size * Math.sin(b.angle),
            )
            expect(off / unit, `${kind} ${sense}`).toBeLessThan(1e-9)
          }
        }
      }
    },
  )

  it('v8f-4200 at 9,000 rpm: 31.8 kN of second order straight across, under 1 N upright (common practice)', () => {
    const speed = (9000 * 2 * Math.PI) / 60
    const train = reciprocatingAlone(trainOf(preset('v8f-4200')))
    const [, first] = textbookOrders(train)
    const [, second] = exactOrders(train)
    expect((first.force.major * speed ** 2) / 1000).toBeCloseTo(31.8, 1)
    expect(first.force.minor * speed ** 2).toBeLessThan(1)
    // the exact motion's second order is larger by A2/λ
    const { ratio } = inertiaScale(train)
    expect(second.force.major / first.force.major).toBeCloseTo(
      1 + ratio ** 2 / 4 + (15 * ratio ** 4) / 128,
      4,
    )
    expect((second.force.tilt * 180) / Math.PI).toBeCloseTo(90, 6)
    expect(second.force.minor * speed ** 2).toBeLessThan(1)
  })

  it('the long axis of a single’s ellipse lies along its bore, wherever that points', () => {
    for (const bank of [0, 30, 90, 160]) {
      const [first, second] = exactOrders(trainOf(layout([{ pin: 0, bank, z: 0 }])))
      expect((first.force.tilt * 180) / Math.PI).toBeCloseTo(bank, 6)
      expect((second.force.tilt * 180) / Math.PI).toBeCloseTo(bank, 6)
      expect(first.force.minor).toBeLessThan(1e-12)
    }
  })
})

describe('exactOrders(train) against turningOrders(analyse(train).orders)', () => {
  it.each(presetIds)('%s: a turn of samples without gas gives what the whole analysis gives', (id) => {
    const train = trainOf(preset(id))
    const { orders = [] } = analyse(train, { speed: 300, include: ['orders'] })
    const [own, whole] = [exactOrders(train), turningOrders(orders)]
    const { force } = inertiaScale(train)
    for (const [i, { order, force: f, couple }] of whole.entries()) {
      const off = (kind: 'force' | 'couple', part: Turning) =>
        Math.abs(part.major / 300 ** 2 - own[i][kind].major) +
        Math.abs(part.forward.size / 300 ** 2 - own[i][kind].forward.size)
      expect(off('force', f) / force, `order ${order}`).toBeLessThan(1e-9)
      expect(off('couple', couple) / force, `order ${order} couple`).toBeLessThan(1e-9)
    }
  })
})
