import { evaluate as arithmetic } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { analyse, type Analysis } from '@/lib/mechanics/analysis'
import { evaluate, substitute } from '@/lib/mechanics/explain/formula'
import { explain, figureIds, type FigureId } from '@/lib/mechanics/explain/explain'
import type { Asked, Sizes } from '@/lib/mechanics/explain/engine'
import { method } from '@/lib/mechanics/method'
import { scaleFor } from '@/lib/units/quantities'
import { convert, toSi } from '@/lib/units/units'
import { presetById } from '@/scene/model/presets'
import { sizesOf } from '@/scene/model/sizes'
import { toTrain } from '@/scene/model/to-train'
import { AT, hasNeighbour, hasWeights, rows, sizes, speed } from './explain-rows'

const some = [
  'i4-2000',
  'v8x-5000',
  'v2-45-1600',
  'r7-11',
  'single-125-2t',
  'm6-2t-520',
  'v6-90s-3200',
  'i3-1000',
]

const ofWeights = new Set<FigureId>(['counterweight-share', 'slug-volume', 'slug-mass', 'slug-diameter'])
const given = (of: Sizes): Sizes =>
  Object.fromEntries(Object.entries(of).filter(([, value]) => value !== undefined))

/** Half the last place that the sheet shows. */
function precision(
  value: number,
  unit: Parameters<typeof toSi>[1],
  quantity: Parameters<typeof scaleFor>[1],
) {
  const { digits, unit: shownIn } = scaleFor(toSi(value, unit), quantity, 'si')
  if ('decimals' in digits) return Math.abs(convert(0.5 * 10 ** -digits.decimals, shownIn, unit))
  return Math.max(0.5e-3, 0.5 * 10 ** (1 - digits.significant) * Math.abs(value))
}

/** Worked out by another program, as somebody with a calculator would. */
const byHand = (text: string): number =>
  arithmetic(
    text
      .split(' = ')[0]
      .replaceAll('−', '-')
      .replaceAll('×', '*')
      .replaceAll('²', '^2')
      .replaceAll('³', '^3')
      .replaceAll('root(', 'sqrt('),
    {
      sin: (x: number) => Math.sin((x * Math.PI) / 180),
      cos: (x: number) => Math.cos((x * Math.PI) / 180),
      tan: (x: number) => Math.tan((x * Math.PI) / 180),
      asin: (x: number) => (Math.asin(x) * 180) / Math.PI,
    },
  )

describe.each(some)('explain(%s, figure)', (preset) => {
  const document = presetById(preset)!.train
  const train = toTrain(document)
  const all = analyse(train, { speed }) as Required<Analysis>
  const ids = [train.cylinders[0].id, train.cylinders.at(-1)!.id]

  it.each(rows.filter(({ where }) => where?.(train) ?? true))(
    '$figure is worked out by its formula to the figure of the analysis',
    ({ figure, asked, shown }) => {
      for (const cylinder of ids) {
        const told = explain(train, figure, { speed, angleDeg: AT, cylinder, sizes, ...asked })
        const figureShown = shown(all, cylinder, train)
        const scale = Math.max(1, ...told.symbols.map(({ value }) => Math.abs(value)))
        expect(Math.abs(told.value - figureShown)).toBeLessThanOrEqual(
          1e-9 * Math.max(scale, Math.abs(figureShown)),
        )
        expect(Math.abs(byHand(told.substituted) - figureShown)).toBeLessThanOrEqual(
          precision(figureShown, told.unit, told.quantity),
        )
      }
    },
  )

  it('every figure names its method, source, assumptions and every symbol of its formula, with no Greek letter', () => {
    for (const figure of figureIds) {
      const tell = () =>
        explain(train, figure, {
          speed,
          angleDeg: AT,
          sizes: { counterweightRadius: 0.1, deckHeight: 0.5, ...given(sizesOf(document)) },
          fluctuation: 0.01,
        })
      if (ofWeights.has(figure) && !hasWeights(train)) {
        expect(tell).toThrow('no counterweights')
        continue
      }
      if (figure === 'bore-wall' && !hasNeighbour(train)) {
        expect(tell).toThrow('No other cylinder')
        continue
      }
      const told = tell()
      expect(told.method).toEqual(method)
      expect(told.source.length).toBeGreaterThan(10)
      expect(told.assumptions.length).toBeGreaterThan(0)
      for (const { symbol, name } of told.symbols) {
        expect(told.formula).toContain(symbol)
        expect(name).not.toBe('')
      }
      expect(JSON.stringify(told)).not.toMatch(/[\u0370-\u03ff]/)
      expect(Number.isFinite(told.value)).toBe(true)
      expect(Math.abs(byHand(told.substituted) - told.value)).toBeLessThanOrEqual(
        precision(told.value, told.unit, told.quantity),
      )
    }
  })
})

describe('explain', () => {
  const document = presetById('v8x-5000')!.train
  const train = toTrain(document)
  const ask = (figure: FigureId, more: Partial<Asked> = {}) =>
    explain(train, figure, { speed, sizes: sizesOf(document), ...more })

  it('displacement of a V8 reads as its formula, with the values put in and the result', () => {
    const told = ask('displacement')
    expect(told.formula).toBe('pi / 4 × bore² × true stroke × cylinders / 1000')
    expect(told.substituted).toMatch(/^pi \/ 4 × 95² × 88\.2 × 8 \/ 1000 = 5,001 cm³$/)
  })
  it('unequal cylinders are summed one by one', () => {
    const unequal = {
      ...train,
      cylinders: train.cylinders.map((each, i) => (i === 2 ? { ...each, bore: 0.1 } : each)),
    }
    const told = explain(unequal, 'displacement', { speed })
    expect(told.symbols).toHaveLength(8)
    expect(told.value).toBeCloseTo(analyse(unequal, { speed, include: [] }).train.displacementCc, 9)
  })
  it('bob-weight = rotating + oil + factor × reciprocating, and the factor is found back from it', () => {
    const { balance } = analyse(train, { speed, include: ['balance'] })
    expect(ask('bob-weight', { throw: '2' }).value).toBeCloseTo(balance!.bobWeights['2'].kg, 12)
    const factor = ask('balance-factor')
    expect(factor.value).toBeCloseTo(50, 9)
    // half of two cylinders' is the whole of one's
    expect(factor.beside!.value).toBeCloseTo(100, 9)
  })
  it('the second order of a flat-plane four stands beside its textbook term, 4 × the second-order force of a cylinder', () => {
    const four = { ...toTrain(presetById('i4-2000')!.train) }
    const straight = { ...four, cylinders: four.cylinders.map((each) => ({ ...each, offset: 0 })) }
    const told = explain(straight, 'order-forward', { speed, order: 2 })
    const one = explain(straight, 'second-order-force', { speed })
    expect(told.beside!.value).toBeCloseTo(2 * one.value, 6)
    expect(told.value / told.beside!.value).toBeGreaterThan(1.01)
    expect(told.value / told.beside!.value).toBeLessThan(1.05)
  })
  it('mean torque is net IMEP × swept volume over 4 pi (D-11)', () => {
    const imep = ask('imep').value * 1e5
    const swept = ask('displacement').value * 1e-6
    expect(ask('torque-mean').value / ((imep * swept) / (4 * Math.PI))).toBeCloseTo(1, 4)
  })
  it('flywheel and speed fluctuation are each the other turned round', () => {
    const own = document.inertia!.flywheelKgM2! + document.inertia!.freeEndKgM2!
    expect(ask('flywheel').value).toBeCloseTo(own, 9)
    const wanted = ask('flywheel', { fluctuation: 0.004 })
    expect(wanted.value).toBeCloseTo((own * ask('speed-fluctuation').value) / 0.004, 9)
  })
  it('a half disc of 20 mm steel and 89.5 mm radius holds 75 kg mm', () => {
    // 2/3 × 7.85e-6 kg/mm³ × 20 mm × 89.5³ mm³, worked out apart
    expect(ask('counterweight-capacity').value).toBeCloseTo(75037.6, 0)
  })
  it('journal overlap of the V8 preset is 16.4 mm, and its ratios those of the sizes', () => {
    expect(ask('journal-overlap').value).toBeCloseTo(16.4, 9)
    expect(ask('rod-to-stroke').value).toBeCloseTo(156 / 88.2, 9)
    expect(ask('bore-to-stroke').value).toBeCloseTo(95 / 88.2, 9)
  })
  it('compression volume with the swept volume gives the compression ratio back', () => {
    const swept = ask('displacement').value / 8
    const clearance = ask('compression-volume').value
    expect((swept + clearance) / clearance).toBeCloseTo(11.4, 9)
  })
  it('a part that is not there is said by name', () => {
    expect(() => ask('rod-load', { cylinder: '99' })).toThrow('no cylinder “99”')
    expect(() => ask('order-forward', { order: 0.3 })).toThrow('no order 0.3')
    expect(() => ask('journal-overlap', { sizes: {} })).toThrow('not given')
  })
})

describe('evaluate(formula, symbols)', () => {
  it.each([
    ['2 + 3 × 4', {}, 14],
    ['(2 + 3) × 4', {}, 20],
    ['−a² + 8 / 2 / 2', { a: 3 }, -7],
    ['root(9) × sin(30)', {}, 1.5],
    ['asin(0.5)', {}, 30],
    ['cos(60)³', {}, 0.125],
    ['rod − rod angle', { rod: 5, 'rod angle': 2 }, 3],
  ])('evaluate(%j) is worked out as it is read', (formula, symbols, expected) => {
    expect(evaluate(formula, symbols as unknown as Record<string, number>)).toBeCloseTo(expected, 12)
  })
  it('breaks at what it does not know', () => {
    expect(() => evaluate('2 + tea', {})).toThrow('no meaning')
    expect(() => evaluate('(2 + 3', {})).toThrow('breaks off')
    expect(() => evaluate('2 3', {})).toThrow('does not end')
  })
  it('substitute(formula, texts) puts the longest word first', () => {
    expect(substitute('rod × cos(rod angle)', { rod: '5', 'rod angle': '(−2)' })).toBe('5 × cos(−2)')
  })
})
