import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { formatNumber, formatQuantity, quantityText } from '@/lib/units/format'
import { parseQuantity } from '@/lib/units/parse'
import { quantities, type Quantity } from '@/lib/units/quantities'
import { convert, fromSi, units } from '@/lib/units/units'

describe('formatNumber', () => {
  it('writes thousands with a comma and minus as U+2212', () => {
    expect(formatNumber(1739.8, { decimals: 1 })).toBe('1,739.8')
    expect(formatNumber(-1234567, { decimals: 0 })).toBe('\u22121,234,567')
  })
  it('never writes a negative nothing', () => {
    expect(formatNumber(-0.0004, { decimals: 2 })).toBe('0.00')
    expect(formatNumber(-0, { significant: 3 })).toBe('0.00')
  })
  it('formatNumber(x, { significant: 3 }) keeps three figures whatever the size', () => {
    expect(formatNumber(29063, { significant: 3 })).toBe('29,100')
    expect(formatNumber(29.063, { significant: 3 })).toBe('29.1')
    expect(formatNumber(0.029063, { significant: 3 })).toBe('0.0291')
    expect(formatNumber(999.6, { significant: 3 })).toBe('1,000')
  })
  it('shows a dash for what is no number', () => expect(formatNumber(NaN, { decimals: 1 })).toBe('–'))
})

describe('formatQuantity', () => {
  it('changes the unit with the size: 246.6 N, 29.1 kN', () => {
    expect(quantityText(246.6, 'force', 'si')).toBe('247 N')
    expect(quantityText(29063, 'force', 'si')).toBe('29.1 kN')
  })
  it('changes the unit with the system', () => {
    expect(quantityText(0.095, 'length', 'si')).toBe('95.0 mm')
    expect(quantityText(0.095, 'length', 'us')).toBe('3.740 in')
    expect(quantityText(0.388, 'mass', 'us')).toBe('13.69 oz')
    // 1 lbf = 4.4482216152605 N, from the exact pound and standard gravity
    expect(quantityText(4448.2216, 'force', 'us')).toBe('1,000 lbf')
  })
  it('closes degrees up', () => expect(quantityText(Math.PI / 2, 'angle', 'si')).toBe('90.0°'))
  it('gives figure and unit apart', () => {
    expect(formatQuantity(533, 'torque', 'si')).toEqual({ text: '533', unit: 'N m' })
  })
})

describe('units', () => {
  it('are exact by definition', () => {
    expect(units.in.factor).toBe(0.0254)
    expect(units.lb.factor).toBe(0.45359237)
    expect(units.oz.factor * 16).toBe(0.45359237)
    // 1 oz in of unbalance is 720.08 g mm (common practice, agrees with the exact ounce and inch)
    expect(convert(1, 'oz in', 'g mm')).toBeCloseTo(720.0779, 4)
  })
  it('convert(convert(x, a, b), b, a) returns x to 1e-12 after twenty turns', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (start) => {
        let value = start
        for (let i = 0; i < 20; i++) value = convert(convert(value, 'mm', 'in'), 'in', 'mm')
        expect(Math.abs(value - start)).toBeLessThanOrEqual(1e-12 * start)
      }),
    )
  })
  it('parseQuantity reads back what formatQuantity writes, in both systems, for every quantity', () => {
    for (const quantity of Object.keys(quantities) as Quantity[])
      for (const system of ['si', 'us'] as const)
        for (const scale of quantities[quantity][system]) {
          const si = (scale.from ?? 0) + 7.25 * units[scale.unit].factor
          const { text, unit } = formatQuantity(si, quantity, system, { significant: 6 }, scale)
          const parsed = parseQuantity(`${text} ${unit}`, quantity, system)
          expect(parsed.ok, `${quantity} ${text} ${unit}`).toBe(true)
          if (parsed.ok) expect(Math.abs(parsed.value - si)).toBeLessThan(1e-5 * si)
        }
  })
  it('fromSi drops only the last bit', () => expect(fromSi(0.095, 'mm')).toBe(95))
})
