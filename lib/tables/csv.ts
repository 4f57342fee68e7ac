import Papa from 'papaparse'
import { fileCell, fileHead, type Stamp, type Table } from './table'

/**
 * A table as CSV (RFC 4180) with units in the header and SI values; the stamp's lines stand below it. Text that a
 * spreadsheet would run as a formula is written with an apostrophe before it.
 */
export function tableCsv(table: Table, stamp: Stamp = {}): string {
  const write = (rows: unknown[][]) => Papa.unparse(rows, { escapeFormulae: true, newline: '\r\n' })
  const body = table.rows.map((row) => row.map((cell, i) => fileCell(cell, table.columns[i])))
  const foot = Object.entries({ table: table.title, ...stamp })
  return `${write([table.columns.map(fileHead), ...body])}\r\n\r\n${write(foot)}\r\n`
}
