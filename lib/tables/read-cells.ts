import Papa from 'papaparse'

export type Separator = ',' | ';' | '\t'

/** The cells of a text table; `rows[0]` is the first line, so that a row's place in the file is its index and one. */
export interface Cells {
  separator: Separator
  rows: string[][]
}

/** Reads separated text (RFC 4180, or with semicolons or tabs): the first line that is not blank tells by what. */
export function readCells(text: string): Cells {
  const plain = text.replace(/^\ufeff/, '')
  const head = plain.split(/\r?\n|\r/).find((line) => line.trim() !== '') ?? ''
  const unquoted = head.replace(/"[^"]*"/g, '')
  const separator = (['\t', ';'] as const).find((sign) => unquoted.includes(sign)) ?? ','
  const { data } = Papa.parse<string[]>(plain, { delimiter: separator, skipEmptyLines: false })
  return { separator, rows: data.map((row) => row.map((cell) => cell.trim())) }
}
