import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { tableCsv } from '@/lib/tables/csv'
import { tableJson } from '@/lib/tables/json'
import { fileUnit } from '@/lib/units/file-unit'

const table = {
  title: 'Loads, cylinder 1',
  columns: [
    { name: 'Remark', unit: '' },
    { name: 'Gas force', unit: 'lbf', si: fileUnit('lbf') },
    { name: 'Bore', unit: 'mm' },
  ],
  rows: [
    ['=HYPERLINK("x")', 1000, 95],
    ['-2', -3, 95],
    ['@sum', 0, 95],
    ['+1', null, 95],
    ['\t=1', 1 / 3, 95],
    ['said "so", twice', 2, 95],
  ],
}

describe('tableCsv(table, stamp)', () => {
  const rows = Papa.parse<string[]>(tableCsv(table, { scene: '=evil', version: '3' })).data
  it('writes units into the header and SI into the cells', () => {
    expect(rows[0]).toEqual(['Remark', 'Gas force, N', 'Bore, mm'])
    expect(Number(rows[1][1])).toBeCloseTo(4448.2216152605, 9)
    expect(rows[2][1]).toBe(String(-3 * 4.4482216152605))
  })
  it('no cell is run by a spreadsheet; a negative number stays a number', () => {
    for (const row of rows)
      for (const cell of row)
        if (!/^-?[\d.]+(e[-+]\d+)?$/.test(cell)) expect(cell).not.toMatch(/^[=+\-@\t\r]/)
    expect(rows[1][0]).toBe(`'=HYPERLINK("x")`)
  })
  it('says where the figures come from, below them', () => {
    expect(rows.slice(8)).toEqual([
      ['table', 'Loads, cylinder 1'],
      ['scene', "'=evil"],
      ['version', '3'],
      [''],
    ])
  })
})

describe('tableJson(table, stamp)', () => {
  it('carries the same cells by the same headers, beside the stamp', () => {
    const read = JSON.parse(tableJson(table, { version: '3' }))
    expect(read.version).toBe('3')
    expect(read.rows[0]).toEqual({
      Remark: '=HYPERLINK("x")',
      'Gas force, N': 4448.2216152605,
      'Bore, mm': 95,
    })
    expect(read.rows[3]['Gas force, N']).toBeNull()
  })
})
