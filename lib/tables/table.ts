export type Cell = number | string | null

export interface Column {
  name: string
  /** As shown: mm, N, lbf, °; empty for a name or a count. */
  unit: string
  /** How a shown value is written in a file, where that is another unit: value × factor. Files carry SI. */
  si?: { unit: string; factor: number }
  /** Decimals of a number on the screen; files carry it unrounded. */
  decimals?: number
}

/** Figures in rows: what a chart shows, what a table lists and what a file carries are one thing. */
export interface Table {
  title: string
  columns: Column[]
  rows: Cell[][]
}

/** What a file says about where its figures come from: name → words. */
export type Stamp = Record<string, string>

/** Header of a column in a file: "Gas force, N". */
export const fileHead = ({ name, unit, si }: Column): string => {
  const written = si?.unit ?? unit
  return written === '' ? name : `${name}, ${written}`
}

/** A cell as it goes into a file. */
export const fileCell = (cell: Cell, { si }: Column): Cell =>
  typeof cell === 'number' && si ? cell * si.factor : cell
