import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { canonicalJson } from '@/lib/review/canonical-json'

describe('canonicalJson()', () => {
  it('canonicalJson() writes the sample of RFC 8785, section 3.2.2, as section 3.2.4 has it', () => {
    const sample = `{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\\u20ac$\\u000F\\u000aA'\\u0042\\u0022\\u005c\\\\\\"\\/",
      "literals": [null, true, false]
    }`
    expect(canonicalJson(JSON.parse(sample))).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
        '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    )
  })

  it('canonicalJson() sorts members by UTF-16 code units, as in RFC 8785, section 3.2.3', () => {
    const sample = {
      '\u20ac': 'Euro Sign',
      '\r': 'Carriage Return',
      '\ufb33': 'Hebrew Letter Dalet With Dagesh',
      '1': 'One',
      '\ud83d\ude00': 'Emoji: Grinning Face',
      '\u0080': 'Control',
      '\u00f6': 'Latin Small Letter O With Diaeresis',
    }
    const places = [
      'Carriage Return',
      'One',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh',
    ].map((word) => canonicalJson(sample).indexOf(word))
    expect(places.every((place) => place > 0)).toBe(true)
    expect(places).toEqual([...places].sort((a, b) => a - b))
  })

  it('canonicalJson(NaN), of half a surrogate pair and of undefined members is refused', () => {
    for (const value of [NaN, Infinity, '\ud800', { a: undefined }, () => 1]) {
      expect(() => canonicalJson(value)).toThrow()
    }
  })

  it('canonicalJson() of a value is the same in whatever order its members came, and reads back as the value', () => {
    const value = fc.dictionary(
      fc.string({ unit: 'grapheme' }),
      fc.double({ noNaN: true, noDefaultInfinity: true }),
    )
    fc.assert(
      fc.property(value, (members) => {
        const turned = Object.fromEntries(Object.entries(members).reverse())
        const text = canonicalJson(members)
        expect(canonicalJson(turned)).toBe(text)
        expect(canonicalJson(JSON.parse(text))).toBe(text)
      }),
    )
  })
})
