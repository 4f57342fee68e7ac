import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { analyse, type Analysis } from '@/lib/mechanics/analysis'
import { analysisTables } from '@/lib/sheet/analysis-tables'
import { tableCsv } from '@/lib/tables/csv'
import { tablesJson } from '@/lib/tables/json'
import { fileHead, type Stamp, type Table } from '@/lib/tables/table'
import type { CrankTrain } from '@/scene/model/crank-train'
import { presets } from '@/scene/model/presets'
import { toTrain } from '@/scene/model/to-train'

const stamp: Stamp = {
  title: '=1+1',
  scene: 'abc',
  version: '3',
  written: '2026-12-01T10:00:00.000Z',
  method: 'm, 1',
}
const analysisOf = (document: CrankTrain, stepDeg = 10) =>
  analyse(toTrain(document), { speed: 400, stepDeg }) as Required<Analysis>

/** The cells of the table's own rows as they would be read back. */
function readBack(table: Table): { head: string[]; rows: string[][]; foot: string[][] } {
  const [own, foot] = tableCsv(table, stamp).split('\r\n\r\n')
  const [head, ...rows] = Papa.parse<string[]>(own).data
  return { head, rows, foot: Papa.parse<string[]>(foot.trim()).data }
}

/** What a spreadsheet takes for a formula when it opens a file. */
const runs = /^[=+\-@\t\r]/
const plainNumber = /^-?\d+(\.\d+)?(e[+-]?\d+)?$/i

describe('analysisTables', () => {
  it.each(presets.map(({ id, train }) => [id, train] as const))(
    'every table of %s comes back from its CSV, number by number, with units in the headers and its stamp',
    (_, document) => {
      const tables = analysisTables(analysisOf(document))
      expect(new Set(tables.map(({ title }) => title)).size).toBe(tables.length)
      for (const table of tables) {
        const { head, rows, foot } = readBack(table)
        expect(head).toEqual(table.columns.map(fileHead))
        expect(rows).toHaveLength(table.rows.length)
        rows.forEach((row, i) =>
          row.forEach((cell, k) => {
            const value = table.rows[i][k]
            const factor = table.columns[k].si?.factor ?? 1
            if (typeof value === 'number') expect(Number(cell)).toBe(value * factor + 0)
            else expect(cell).toBe(value ?? '')
          }),
        )
        const said = Object.fromEntries(foot)
        expect(said).toMatchObject({ table: table.title, scene: 'abc', version: '3', method: 'm, 1' })
        expect(said.written).toBe(stamp.written)
      }
    },
  )

  it('headers name the units of files: of the SI or accepted beside it', () => {
    const heads = analysisTables(analysisOf(presets[0].train)).flatMap(({ columns }) => columns.map(fileHead))
    for (const head of ['Pin height, mm', 'Pressure, bar', 'Static, kg mm', 'Gas force, N', 'Velocity, m/s'])
      expect(heads).toContain(head)
    expect(heads.filter((head) => /, (in|lbf|psi|oz|lb|ft)/.test(head))).toEqual([])
  })

  it('holds every signal and figure of the analysis', () => {
    const document = presets.find(({ id }) => id === 'r7-11')!.train
    const analysis = analysisOf(document, 30)
    const found = new Set(analysisTables(analysis).flatMap(({ rows }) => rows.flat()))
    const missing: string[] = []
    const walk = (value: unknown, path: string) => {
      if (typeof value === 'number' && !found.has(value)) missing.push(path)
      else if (value !== null && typeof value === 'object')
        for (const [name, inner] of Object.entries(value)) walk(inner, `${path}.${name}`)
    }
    walk(analysis, '')
    // a dead centre and a true stroke are not of the tables along the angle; the grade is the asker's own
    const known = /\.(tdcDeg|bdcDeg|strokeMm|gradeMmS)$/
    expect(missing.filter((path) => !known.test(path))).toEqual([])
  })

  it.each(['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\rx', '=cmd|"/c calc"!A1'])(
    'a cylinder, throw or main called %j is no formula in any cell of a file',
    (name) => {
      const document = structuredClone(presets.find(({ id }) => id === 'single-450')!.train)
      document.title = name
      document.cylinders[0].id = name
      document.firingOrder = [name]
      document.collectors = [{ id: name, cylinders: [name] }]
      document.throws[0].id = name
      document.cylinders[0].throw = name
      document.mains[0].id = name
      const tables = analysisTables(analysisOf(document))
      expect(tables.some(({ rows }) => rows.some((row) => row.includes(name)))).toBe(true)
      for (const table of tables) {
        const cells = Papa.parse<string[]>(tableCsv(table, stamp)).data.flat()
        expect(cells.filter((cell) => runs.test(cell) && !plainNumber.test(cell))).toEqual([])
      }
    },
  )

  it('tablesJson carries all tables in one file, SI values unrounded', () => {
    const analysis = analysisOf(presets[5].train)
    const tables = analysisTables(analysis)
    const read = JSON.parse(tablesJson(tables, stamp)) as {
      scene: string
      tables: Record<string, Record<string, number>[]>
    }
    expect(read.scene).toBe('abc')
    expect(Object.keys(read.tables)).toEqual(tables.map(({ title }) => title))
    read.tables['Turning moment'].forEach((row, i) =>
      expect(row['Total, N m']).toBe(analysis.torque.totalNm[i]),
    )
  })
})
