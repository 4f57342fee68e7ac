import type { ReactNode } from 'react'
import type { Table } from '@/lib/tables/table'
import { BehindFigure, type Behind } from './behind'

/** Makes the figures of a table pressable, those of which something is known. */
export function behindCell(table: Table, behindOf: (row: number, column: number) => Behind | undefined) {
  return function cell(text: string, row: number, column: number): ReactNode {
    const behind = table.rows[row][column] === null ? undefined : behindOf(row, column)
    return behind === undefined ? text : <BehindFigure behind={behind}>{text}</BehindFigure>
  }
}
