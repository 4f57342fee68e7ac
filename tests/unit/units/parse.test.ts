import { describe, expect, it } from 'vitest'
import { parseQuantity } from '@/lib/units/parse'
import { convert } from '@/lib/units/units'

const mm = (text: string) => {
  const parsed = parseQuantity(text, 'length', 'si')
  if (!parsed.ok) throw new Error(parsed.message)
  return convert(parsed.number, parsed.unit, 'mm')
}
const refusal = (...args: Parameters<typeof parseQuantity>) => {
  const parsed = parseQuantity(...args)
  if (parsed.ok) throw new Error(`took ${parsed.value}`)
  return parsed
}

describe('parseQuantity', () => {
  it("parseQuantity('88.9', 'length', 'si') gives exactly the typed number in the bare unit", () => {
    expect(mm('88.9')).toBe(88.9)
    expect(mm('95.0')).toBe(95)
  })
  it.each([
    ['3.74 in', 94.996],
    ['3.5 in', 88.9],
    ['3 1/2"', 88.9],
    ['3½"', 88.9],
    ['3-1/2 in', 88.9],
    ['88,9 mm', 88.9],
    ['8.89cm', 88.9],
    ['1,234.5', 1234.5],
    ['1 234.5', 1234.5],
    ['\u22123.2', -3.2],
    ['1e2', 100],
  ])('parseQuantity(%j, length) is %d mm', (text, expected) => expect(mm(text)).toBe(expected))

  it('reads a bare number in the system that is shown, and a suffix in its own unit', () => {
    const us = parseQuantity('3.74', 'length', 'us')
    expect(us.ok && us.value).toBeCloseTo(0.094996, 12)
    const mass = parseQuantity('1150', 'mass', 'kg')
    expect(mass.ok && mass.value).toBe(1150)
    const speed = parseQuantity('6,500 rpm', 'speed', 'si')
    expect(speed.ok && speed.number).toBe(6500)
    const pressure = parseQuantity('14.7 psi', 'pressure', 'si')
    // 14.7 lbf/in² from the exact pound, standard gravity and inch
    expect(pressure.ok && pressure.value).toBeCloseTo(101352.932, 3)
  })

  it("parseQuantity('3,500', 'length') asks whether the comma is a point (U01)", () => {
    const asked = refusal('3,500', 'length', 'si')
    expect(asked.code).toBe('U01')
    expect(asked.message).toContain('3.5 or 3500')
    expect(asked.mends.map((mend) => mm(mend.text))).toEqual([3.5, 3500])
  })
  it("parseQuantity('3,500', 'speed') is 3500 rpm: that is how the sheet itself writes it", () => {
    const parsed = parseQuantity('3,500', 'speed', 'si')
    expect(parsed.ok && parsed.number).toBe(3500)
  })
  it('tells an unbalance from a torque (U02)', () => {
    expect(refusal('12 ozf in', 'unbalance', 'us').message).toContain('oz in')
    expect(parseQuantity('12 oz in', 'unbalance', 'us').ok).toBe(true)
  })
  it.each(['', '   ', 'NaN', '1e999', '🙂', '-', 'Infinity'])(
    'parseQuantity(%j) is no number and says so (U04)',
    (text) => {
      const refused = refusal(text, 'length', 'si')
      expect(refused.code).toBe('U04')
      expect(refused.message).toMatch(/^Not a number\. Nothing was changed\./)
    },
  )
  it("parseQuantity('ninety', 'angle') names what was typed and gives an example (A02)", () => {
    expect(refusal('ninety', 'angle', 'si').message).toBe(
      'Could not read “ninety” as an angle. Example: 90 or 90.0°.',
    )
  })
  it('refuses the unit of another quantity by name', () => {
    expect(refusal('95 mm', 'mass', 'si').message).toContain('mm is the unit of a length, and this is a mass')
    expect(refusal('95 furlongs', 'length', 'si').message).toContain('furlongs')
  })
})
