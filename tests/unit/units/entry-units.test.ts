import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { quantityField } from '@/scene/session/field'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import { parseQuantity } from '@/lib/units/parse'
import { quantities, scaleFor, type Quantity } from '@/lib/units/quantities'
import { convert, fromSi, toSi, units, type UnitName } from '@/lib/units/units'

const all = Object.keys(quantities) as Quantity[]
const number = fc.double({ min: 1e-3, max: 1e5, noNaN: true })

describe('no drift (D-02)', () => {
  it.each(all)('a value of %s shown 20 times in SI and US by turns drifts by less than 1e-12', (quantity) => {
    fc.assert(
      fc.property(number, (typed) => {
        const si = scaleFor(0, quantity, 'si').unit
        const us = scaleFor(0, quantity, 'us').unit
        const first = toSi(typed, si)
        let value = first
        for (let turn = 0; turn < 20; turn++)
          value = toSi(fromSi(value, turn % 2 ? si : us), turn % 2 ? si : us)
        expect(Math.abs(value / first - 1)).toBeLessThan(1e-12)
      }),
    )
  })
  it('what is typed in any unit that a quantity takes is within 1e-12 of its exact value', () => {
    fc.assert(
      fc.property(fc.constantFrom(...all), number, fc.nat(), (quantity, typed, pick) => {
        const { accepts } = quantities[quantity]
        const unit: UnitName = accepts[pick % accepts.length]
        const text = String(Number(typed.toPrecision(12)))
        const parsed = parseQuantity(`${text} ${unit}`, quantity, 'si')
        expect(parsed.ok).toBe(true)
        if (parsed.ok)
          expect(Math.abs(parsed.value / (Number(text) * units[unit].factor) - 1)).toBeLessThan(1e-12)
      }),
    )
  })
  it('what a field shows can be typed back in either system within what it shows', () => {
    const scene = newScene(presetById('i4-2000')!.train)
    fc.assert(
      fc.property(fc.double({ min: 20, max: 200, noNaN: true }), (mm) => {
        const field = quantityField({
          key: 'x',
          label: 'X',
          quantity: 'length',
          documentUnit: 'mm',
          get: () => mm,
          changes: (value) => [{ path: ['train', 'x'], value }],
        })
        for (const system of ['si', 'us'] as const) {
          const shown = field.show(scene, system)
          const read = field.read(shown.text, scene, system)
          expect(read.ok && Math.abs(Number(read.changes[0].value) - mm)).toBeLessThanOrEqual(
            system === 'si' ? 0.05 : 0.0127,
          )
        }
      }),
    )
  })
})

describe('parseQuantity, as it is typed in a shop', () => {
  it.each([
    ['3.5 in', 88.9],
    ['3 1/2"', 88.9],
    ['3-1/2 in', 88.9],
    ['88.9', 88.9],
    ['88,9 mm', 88.9],
    ['8.89 cm', 88.9],
    ['7/8 in', 22.225],
    ['-1/4"', -6.35],
    ["1'", 304.8],
    ['88.9mm', 88.9],
    ['.5 in', 12.7],
  ])('parseQuantity(%j, length) is %d mm', (text, mm) => {
    const parsed = parseQuantity(text, 'length', 'si')
    expect(parsed.ok && convert(parsed.number, parsed.unit, 'mm')).toBeCloseTo(mm, 10)
  })
  it.each([
    ['21.4 oz in', 'unbalance', 21.4 * 720.0778875e-6],
    ['1 ozf in', 'torque', 0.00706155],
    ['393 lbf ft', 'torque', 532.836],
    ['9890 lbf', 'force', 43992.9],
    ['145 psi', 'pressure', 999740],
    ['13.7 oz', 'mass', 0.388388],
    ['1.2 lb', 'mass', 0.544311],
    ['0.05 lb ft²', 'inertia', 0.00210701],
    ['3760 ft/min', 'velocity', 19.1008],
  ] as const)('parseQuantity(%j, %s) is %d SI', (text, quantity, si) => {
    const parsed = parseQuantity(text, quantity, 'us')
    expect(parsed.ok && parsed.value / si).toBeCloseTo(1, 5)
  })
  it('a moment in ounce-inches of unbalance is told from one of force (U02)', () => {
    const asked = parseQuantity('12 oz in', 'torque', 'us')
    expect(asked.ok ? '' : asked.message).toContain('not unbalance (oz in)')
  })
  it('no text whatever makes it throw, and none gives a number that is not finite', () => {
    fc.assert(
      fc.property(fc.string(), fc.constantFrom(...all), (text, quantity) => {
        const parsed = parseQuantity(text, quantity, 'si')
        expect(parsed.ok ? Number.isFinite(parsed.value) : parsed.message.length > 0).toBe(true)
      }),
    )
  })
})
