import { fileCell, fileHead, type Stamp, type Table } from './table'

/** Each row by the headers of its columns, units in them, SI values. */
function rowsOf({ columns, rows }: Table) {
  const heads = columns.map(fileHead)
  return rows.map((row) => Object.fromEntries(row.map((cell, i) => [heads[i], fileCell(cell, columns[i])])))
}

/** A table as JSON: the stamp, then its rows. */
export const tableJson = (table: Table, stamp: Stamp = {}): string =>
  JSON.stringify({ table: table.title, ...stamp, rows: rowsOf(table) }, null, 2)

/** Many tables in one file: the stamp, then the rows of each under its title. */
export const tablesJson = (tables: readonly Table[], stamp: Stamp = {}): string =>
  JSON.stringify({
    ...stamp,
    tables: Object.fromEntries(tables.map((table) => [table.title, rowsOf(table)])),
  })
