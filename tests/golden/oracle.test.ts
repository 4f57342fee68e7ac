import { describe, expect, it } from 'vitest'
import { answer } from '@/tests/support/mechanics/kernel'
import { orderOf, type Place } from '@/tests/support/mechanics/layout'
import { layouts } from '@/tests/support/mechanics/layouts'
import { idealReciprocating, preset, presetIds } from '@/tests/support/mechanics/presets'

/**
 * Free forces and couples by order, in units of one cylinder's force of that order (F1, F2) and of that force times the
 * throw spacing: what balancing tables print (common practice; the values are standard handbook coefficients).
 */
type Row = [max: number, forward?: number, backward?: number]

const expectRow = (
  name: string,
  got: { max: number; forward: number; backward: number },
  [max, forward, backward]: Row,
) => {
  expect(Math.abs(got.max - max), `${name}: ${got.max} against ${max}`).toBeLessThan(1e-3)
  if (forward === undefined) return
  expect(Math.abs(got.forward - forward), `${name} forward: ${got.forward} against ${forward}`).toBeLessThan(
    1e-3,
  )
  expect(
    Math.abs(got.backward - backward!),
    `${name} backward: ${got.backward} against ${backward}`,
  ).toBeLessThan(1e-3)
}

describe('orders of analyse(train, …): the table of layouts (common practice)', () => {
  it.each(Object.entries(layouts))('%s', (_, { places, force1, couple1, force2, couple2 }) => {
    const [first, second] = [orderOf(places, 1), orderOf(places, 2)]
    expectRow('first-order force', first.force, force1)
    expectRow('second-order force', second.force, force2)
    if (couple1) expectRow('first-order couple', first.couple, couple1)
    if (couple2) expectRow('second-order couple', second.couple, couple2)
  })

  it('V8 90° flat plane: the second-order force lies straight across the V', () => {
    const { force } = orderOf(layouts['V8 90 flat'].places, 2)
    expect(force.axisDeg).toBeCloseTo(90, 6)
    expect(force.min).toBeLessThan(1e-9)
  })
})

/** F1, M1, F2, M2 of the presets: [greatest, forward, backward]; couples in units of the throw spacing given. */
const table: Record<string, { spacingMm?: number; F1: Row; M1?: Row; F2: Row; M2?: Row }> = {
  'single-450': { F1: [1, 0.5, 0.5], F2: [1, 0.5, 0.5] },
  'single-125-2t': { F1: [1, 0.5, 0.5], F2: [1, 0.5, 0.5] },
  'p2-270-700': {
    spacingMm: 96,
    F1: [1.414, 0.707, 0.707],
    M1: [0.707, 0.354, 0.354],
    F2: [0],
    M2: [1, 0.5, 0.5],
  },
  'v2-45-1600': { F1: [1.707, 1, 0.707], F2: [1.307, 0.924, 0.383] },
  'v2-90-1000': { F1: [1, 1, 0], F2: [1.414, 0.707, 0.707] },
  'i3-1000': { spacingMm: 79, F1: [0], M1: [1.732, 0.866, 0.866], F2: [0], M2: [1.732, 0.866, 0.866] },
  'i4-2000': { spacingMm: 92, F1: [0], M1: [0], F2: [4, 2, 2], M2: [0] },
  'i4x-1000': { spacingMm: 84, F1: [0], M1: [3.162, 1.581, 1.581], F2: [0], M2: [0] },
  'i5-2500': { spacingMm: 92.5, F1: [0], M1: [0.449, 0.225, 0.225], F2: [0], M2: [4.98, 2.49, 2.49] },
  'i6-3000': { spacingMm: 92, F1: [0], M1: [0], F2: [0], M2: [0] },
  'i6d-12800': { spacingMm: 168, F1: [0], M1: [0], F2: [0], M2: [0] },
  'm6-2t-520': { spacingMm: 900, F1: [0], M1: [0], F2: [0], M2: [3.464, 1.732, 1.732] },
  'b4-2000': { spacingMm: 113, F1: [0], M1: [0], F2: [0], M2: [0.673, 0.336, 0.336] },
  'b6-3400': { spacingMm: 118, F1: [0], M1: [0], F2: [0], M2: [0] },
  'v6-60-3000': { spacingMm: 106, F1: [0], M1: [1.5, 1.5, 0], F2: [0], M2: [1.5, 0, 1.5] },
  'v6-90s-3200': { spacingMm: 109, F1: [0], M1: [2.121, 1.673, 0.448], F2: [0], M2: [2.121, 0.448, 1.673] },
  'v8x-5000': { spacingMm: 106, F1: [0], M1: [3.162, 3.162, 0], F2: [0], M2: [0] },
  'v8f-4200': { spacingMm: 104, F1: [0], M1: [0], F2: [5.657, 2.828, 2.828], M2: [0.612, 0.306, 0.306] },
  'v10-72-5000': { spacingMm: 104, F1: [0], M1: [0.588, 0.449, 0.139], F2: [0], M2: [5.568, 4.029, 1.539] },
  'v12-60-6000': { spacingMm: 101, F1: [0], M1: [0], F2: [0], M2: [0] },
  'r7-11': { F1: [3.5, 3.5, 0], F2: [0] },
}

/** Greatest free force of one cylinder's first order at the greatest speed, kN, and of the couples, N m (invented data). */
const peaks: Record<string, { F1: number; M1?: number; F2?: number; M2?: number }> = {
  'single-450': { F1: 19.32, F2: 5.8 },
  'single-125-2t': { F1: 9.06, F2: 2.26 },
  'p2-270-700': { F1: 15.21, M1: 1033, M2: 404 },
  'v2-45-1600': { F1: 14.49, F2: 4.95 },
  'v2-90-1000': { F1: 21.09, M1: 232, F2: 7.77, M2: 85 },
  'i3-1000': { F1: 8.04, M1: 1101, M2: 331 },
  'i4-2000': { F1: 13.33, F2: 15.94 },
  'i4x-1000': { F1: 16.95, M1: 4502 },
  'i5-2500': { F1: 14.04, M1: 583, M2: 1989 },
  'i6-3000': { F1: 14.43 },
  'i6d-12800': { F1: 29.99 },
  'm6-2t-520': { F1: 512.1, M2: 766215 },
  'b4-2000': { F1: 12.98, M2: 306 },
  'b6-3400': { F1: 16.95 },
  'v6-60-3000': { F1: 13.15, M1: 2090, M2: 574 },
  'v6-90s-3200': { F1: 12.41, M1: 2870, M2: 773 },
  'v8x-5000': { F1: 17.8, M1: 5968 },
  'v8f-4200': { F1: 20.11, F2: 31.82, M2: 358 },
  'v10-72-5000': { F1: 18.19, M1: 1112, M2: 2875 },
  'v12-60-6000': { F1: 15.35 },
  'r7-11': { F1: 8.36 },
}

describe('presets: free forces and couples of equal reciprocating masses (common practice)', () => {
  const places = (id: string, spacing: number): Place[] => {
    const document = preset(id)
    return document.cylinders.map((c) => ({
      pin: document.throws.find((t) => t.id === c.throw)!.angleDeg,
      bank: document.banks.find((b) => b.id === c.bank)!.angleDeg,
      z: c.axialMm / spacing,
    }))
  }

  it.each(presetIds)('%s: order coefficients', (id) => {
    const { spacingMm = 100, F1, M1, F2, M2 } = table[id]
    const [first, second] = [orderOf(places(id, spacingMm), 1), orderOf(places(id, spacingMm), 2)]
    expectRow('F1', first.force, F1)
    expectRow('F2', second.force, F2)
    if (M1) expectRow('M1', first.couple, M1)
    if (M2) expectRow('M2', second.couple, M2)
  })

  it.each(presetIds)('%s: newtons at the greatest speed (second order by its textbook ratio r/l)', (id) => {
    const document = preset(id)
    const rpm = document.operating!.maxRpm!
    const { strokeMm, rodLengthMm } = document.cylinderDefaults!
    const unit = idealReciprocating(id, { alone: true })
    const one = (n: number) => answer(unit, rpm, 5).orders.find((o) => o.order === n)!.vertical.amplitudeN
    const toTextbook = (one(1) * strokeMm!) / 2 / rodLengthMm! / one(2)
    const { F1, F2, M1, M2 } = peaks[id]
    // the table prints couples to whole N m
    const near = (name: string, got: number, wanted: number, rounding = 0) => {
      const allowed = Math.max(0.003 * wanted, rounding)
      expect(Math.abs(got - wanted), `${name}: ${got} against ${wanted}`).toBeLessThanOrEqual(allowed)
    }
    near('F1', one(1) / 1000, F1)
    const all = answer(idealReciprocating(id), rpm, 5).orders
    const [first, second] = [1, 2].map((n) => all.find((o) => o.order === n)!)
    if (F2) near('F2', ((second.forwardN + second.backwardN) * toTextbook) / 1000, F2, 0.005)
    if (M1) near('M1', first.forwardNm + first.backwardNm, M1, 0.5)
    if (M2) near('M2', (second.forwardNm + second.backwardNm) * toTextbook, M2, 0.5)
  })
})
