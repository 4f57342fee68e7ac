import { describe, expect, it } from 'vitest'
import { readCells } from '@/lib/tables/read-cells'
import { gasIssues } from '@/scene/model/checks/gas'
import { readTraceFile } from '@/scene/model/trace-file'
import { presetDocument } from '../mechanics/trains'

const read = (csv: string, cycle: 'four-stroke' | 'two-stroke' = 'four-stroke') => {
  const { rows, separator } = readCells(csv)
  return readTraceFile(rows, separator !== ',', cycle)
}
/** A smooth pressure with its peak 10° after firing top dead centre. */
const bar = (fromFiring: number, half = 360) =>
  2 + 50 * Math.exp(-(((fromFiring - 10) / 40) ** 2)) + 0.5 * Math.cos((Math.PI * fromFiring) / half)
const lines = (from: number, to: number, step: number, write: (angle: number) => string) =>
  Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => write(from + i * step)).join('\n')
const centred = (head = 'angle deg,pressure bar absolute', step = 1, end = 359) =>
  `${head}\n${lines(-360, end, step, (a) => `${a},${bar(a)}`)}\n`
const good = (csv: string, cycle?: 'four-stroke' | 'two-stroke') => {
  const trace = read(csv, cycle)
  if (!trace.ok) throw new Error(JSON.stringify(trace.faults.slice(0, 3)))
  return trace
}
const faults = (csv: string, cycle?: 'four-stroke' | 'two-stroke') => {
  const trace = read(csv, cycle)
  if (trace.ok) throw new Error('was taken')
  return trace
}

describe('a trace that is taken', () => {
  it('from −360 on stands as it is, and the document takes it', () => {
    const { angleDeg, pressureBar, understood } = good(centred())
    expect([angleDeg[0], angleDeg.length, understood]).toEqual([-360, 720, []])
    expect(pressureBar[370]).toBe(bar(10))
    const document = { ...presetDocument('i4-2000'), gas: { model: 'trace' as const, angleDeg, pressureBar } }
    expect(gasIssues(document)).toEqual([])
  })

  it('drops the row that ends the cycle where it began', () => {
    expect(good(centred(undefined, 1, 360)).angleDeg.at(-1)).toBe(359)
  })

  it.each([
    ['firing', 0],
    ['gas exchange', 360],
  ])('from 0 to 720 counted from the %s top dead centre is turned', (word, fires) => {
    const csv = `deg from ${word} TDC;bar abs\n${lines(0, 720, 0.5, (a) => `${a};${bar(((a - fires + 1080) % 720) - 360)}`)}`
    const { angleDeg, pressureBar, understood } = good(csv)
    expect([angleDeg[0], angleDeg.length, understood]).toEqual([-360, 1440, []])
    angleDeg.forEach((angle, i) => expect(pressureBar[i]).toBeCloseTo(bar(angle), 12))
  })

  it('from 0 on without a word is told by its highest pressure, and says so', () => {
    const csv = `deg\tbar abs\n${lines(0, 719, 1, (a) => `${a}\t${bar(a - 360)}`)}`
    const { understood, angleDeg, pressureBar } = good(csv)
    expect(understood).toEqual([
      'The header does not say what 0° is: taken as the gas exchange top dead centre, by the highest pressure at 370°.',
    ])
    expect(angleDeg[pressureBar.indexOf(Math.max(...pressureBar))]).toBe(10)
  })

  it('puts a point at the beginning where none stands there, on the line between its neighbours', () => {
    const csv = `deg from firing;bar a\n${lines(0.25, 719.75, 0.5, (a) => `${a};${bar(a < 360 ? a : a - 720)}`)}`
    const { angleDeg, pressureBar } = good(csv)
    expect([angleDeg[0], angleDeg[1], angleDeg.length]).toEqual([-360, -359.75, 1441])
    expect(pressureBar[0]).toBeCloseTo((pressureBar[1] + pressureBar.at(-1)!) / 2, 12)
  })

  it('of a two-stroke covers one turn, from −180 or from 0', () => {
    const a = good(`deg,bar abs\n${lines(-180, 179, 1, (x) => `${x},${bar(x, 180)}`)}`, 'two-stroke')
    const b = good(
      `deg,bar abs\n${lines(0, 359, 1, (x) => `${x},${bar(x < 180 ? x : x - 360, 180)}`)}`,
      'two-stroke',
    )
    expect(b.angleDeg).toEqual(a.angleDeg)
    expect(b.pressureBar).toEqual(a.pressureBar)
  })

  it.each([
    ['kPa', 100, 1],
    ['MPa', 0.1, 1],
    ['psi', 14.503773773, 1],
    ['bar gauge', 1, 1 + 1.01325 / bar(0)],
  ])('reads pressure in %s', (unit, factor) => {
    const csv = `deg;pressure ${unit}${unit.includes('gauge') ? '' : ' absolute'}\n${lines(-360, 359, 1, (a) => `${a};${bar(a) * factor}`)}`
    const { pressureBar } = good(csv)
    expect(pressureBar[360]).toBeCloseTo(bar(0) + (unit.includes('gauge') ? 1.01325 : 0), 6)
  })

  it('reads radians, decimal commas beside semicolons, a byte-order mark, blank rows, quotes and further columns', () => {
    const comma = (value: number) => String(value).replace('.', ',')
    const csv = `\ufeff\n"No";"Crank angle, rad";"Pressure, bar(a)";Remark\r\n\r\n${lines(-360, 359, 1, (a) => `${a};${comma((a * Math.PI) / 180)};${comma(bar(a))};`).replaceAll('\n', '\r\n')}\r\n;;;\r\n`
    const { angleDeg, pressureBar } = good(csv)
    expect(angleDeg).toHaveLength(720)
    expect(angleDeg[0]).toBeCloseTo(-360, 9)
    expect(pressureBar[370]).toBeCloseTo(bar(10), 9)
  })

  it('says that it took pressures for absolute where the header does not say', () => {
    expect(good(centred('deg,bar')).understood).toEqual([
      'The header does not say gauge: the pressures are taken as absolute.',
    ])
  })

  it('takes 20,000 points', () => {
    const step = 720 / 20_000
    const csv = `deg,bar abs\n${Array.from({ length: 20_000 }, (_, i) => `${(-360 + i * step).toFixed(4)},${bar(-360 + i * step)}`).join('\n')}`
    expect(good(csv).angleDeg).toHaveLength(20_000)
  })
})

describe('a trace that is refused', () => {
  const broken = (row: number, text: string) => {
    const rows = centred().split('\n')
    rows[row - 1] = text
    return rows.join('\n')
  }
  it.each([
    [
      'angle-goes-back',
      214,
      '-160,3',
      'Row 214: angle goes back from −149 to −160. Rows must rise from −360 to 360.',
    ],
    ['angle-repeats', 214, '-149,3', 'Row 214: angle −149 stands twice. Rows must rise from −360 to 360.'],
    ['not-a-number', 5, '-357,n/a', 'Row 5: “n/a” is not a number.'],
    ['not-a-number', 5, 'NaN,3', 'Row 5: “NaN” is not a number.'],
    ['not-a-number', 5, '-357,1e999', 'Row 5: “1e999” is not a number.'],
    ['missing-cell', 6, '-356,', 'Row 6: no pressure.'],
    ['missing-cell', 6, '-356', 'Row 6: no pressure.'],
    ['missing-cell', 6, ',4', 'Row 6: no angle.'],
    ['angle-out-of-range', 7, '400,3', 'Row 7: angle 400 is outside −360 to 360, one four-stroke cycle.'],
    [
      'pressure-out-of-range',
      8,
      '-354,-0.2',
      'Row 8: pressure −0.2 bar is below nothing as an absolute pressure.',
    ],
    [
      'pressure-out-of-range',
      8,
      '-354,1950',
      'Row 8: pressure 1,950 bar is 1,950 bar, more than the 350 bar that a cylinder may hold.',
    ],
  ])('%s in row %d', (code, row, text, message) => {
    expect(faults(broken(row, text))).toMatchObject({ total: 1, faults: [{ row, code, message }] })
  })

  it('tells every row, the first fifty of them and how many there are', () => {
    const csv = centred().replace(/,[\d.]+$/gm, ',x')
    const { faults: told, total } = faults(csv)
    expect([told.length, total, told[0].row, told[49].row]).toEqual([50, 720, 2, 51])
  })

  it('one row that goes back is one fault, not all that follow', () => {
    expect(faults(broken(300, '-200,3')).total).toBe(1)
  })

  it.each([
    ['angle,pressure bar', 'The header “angle | pressure bar” names no unit of angle: deg or rad.'],
    ['deg,pressure', 'The header “deg | pressure” names no unit of pressure: bar, kPa, MPa or psi.'],
  ])('a header “%s” that names no unit', (head, message) => {
    expect(faults(centred(head)).faults).toMatchObject([{ row: 1, code: 'trace-header', message }])
  })

  it('part of a cycle, and which part is missing', () => {
    expect(faults(centred(undefined, 1, 200)).faults[0]).toMatchObject({
      row: 0,
      code: 'trace-not-whole-cycle',
      fix: 'Give rows from −360° to 360°.',
    })
  })

  it('a four-stroke file for a two-stroke engine', () => {
    expect(faults(centred(), 'two-stroke').faults[0]).toMatchObject({ code: 'angle-out-of-range', row: 2 })
  })

  it('from 0 on, where neither the header nor the pressure says what 0 is', () => {
    const csv = `deg,bar abs\n${lines(0, 719, 1, (a) => `${a},${bar(a - 180)}`)}`
    expect(faults(csv).faults[0].fix).toBe(
      'Write “deg from firing TDC” or “deg from gas exchange TDC” in the header.',
    )
  })

  it('more than 20,000 points', () => {
    const csv = `deg,bar abs\n${Array.from({ length: 20_001 }, (_, i) => `${(-360 + (i * 720) / 20_001).toFixed(5)},2`).join('\n')}`
    expect(faults(csv).faults[0]).toMatchObject({
      row: 0,
      code: 'trace-too-long',
      fix: 'Keep one point in 2.',
    })
  })

  it('an empty file', () => {
    expect(faults('\n \n').faults[0].code).toBe('trace-empty')
  })
})
