'use client'

import { useState, type ReactNode } from 'react'
import { formatCell } from './format-cell'
import { SaveFiles } from './save-files'
import type { Column, Table } from '@/lib/tables/table'

interface Props {
  table: Table
  /** Inside something that has a title and saves files itself. */
  bare?: boolean
  /** Which row is chosen, by its place in `table.rows`. */
  chosen?: number | null
  onChoose?(row: number): void
  /** A drawing or a button at the end of a row. */
  more?: { head: string; cell(row: number): ReactNode }
  /** What stands in a cell in place of its bare text. */
  figure?(text: string, row: number, column: number): ReactNode
  /** Rows on one page. */
  page?: number
}

/** Figures in rows: sorted by any column, a page at a time, with files of the whole of it. */
export function DataTable({ table, bare, chosen, onChoose, more, figure, page = 50 }: Props) {
  const [by, setBy] = useState<{ column: number; down: boolean } | null>(null)
  const [from, setFrom] = useState(0)
  const order = table.rows.map((_, i) => i)
  if (by)
    order.sort((a, b) => (by.down ? -1 : 1) * compare(table.rows[a][by.column], table.rows[b][by.column]))
  const start = from < order.length ? from : 0
  const shown = order.slice(start, start + page)
  const sortBy = (column: number) => {
    setBy(by?.column === column ? (by.down ? null : { column, down: true }) : { column, down: false })
    setFrom(0)
  }
  return (
    <div className="data-table">
      <div className="twin" tabIndex={0} role="region" aria-label={table.title}>
        <table className="tab">
          <caption className={bare ? 'vh' : 'cap'}>{table.title}</caption>
          <thead>
            <tr>
              {table.columns.map((column, i) => (
                <th
                  key={column.name}
                  scope="col"
                  className={numeric(table, i) ? 'r' : undefined}
                  aria-sort={by?.column === i ? (by.down ? 'descending' : 'ascending') : 'none'}
                >
                  <button type="button" className="sort" onClick={() => sortBy(i)}>
                    {headOf(column)}
                    {by?.column === i ? (by.down ? ' ↓' : ' ↑') : ''}
                  </button>
                </th>
              ))}
              {more ? <th scope="col">{more.head}</th> : null}
            </tr>
          </thead>
          <tbody>
            {shown.map((row) => (
              <tr
                key={row}
                className={row === chosen ? 'on' : undefined}
                aria-selected={onChoose ? row === chosen : undefined}
                onClick={onChoose && (() => onChoose(row))}
              >
                {table.rows[row].map((cell, i) => (
                  <td
                    key={table.columns[i].name}
                    className={cell === null || typeof cell === 'number' ? 'n' : 'fig'}
                  >
                    {i === 0 && onChoose ? (
                      <button type="button" className="row-button" onClick={() => onChoose(row)}>
                        {formatCell(cell, table.columns[i])}
                      </button>
                    ) : figure ? (
                      figure(formatCell(cell, table.columns[i]), row, i)
                    ) : (
                      formatCell(cell, table.columns[i])
                    )}
                  </td>
                ))}
                {more ? <td>{more.cell(row)}</td> : null}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {order.length > page ? (
        <p className="pages">
          <button type="button" className="btn" disabled={start === 0} onClick={() => setFrom(start - page)}>
            Earlier rows
          </button>
          <span className="cap">
            {start + 1} to {start + shown.length} of {order.length}
          </span>
          <button
            type="button"
            className="btn"
            disabled={start + page >= order.length}
            onClick={() => setFrom(start + page)}
          >
            Later rows
          </button>
        </p>
      ) : null}
      {bare ? null : <SaveFiles table={table} />}
    </div>
  )
}

const headOf = ({ name, unit }: Column) => (unit === '' ? name : `${name}, ${unit}`)

const numeric = (table: Table, column: number) => typeof table.rows[0]?.[column] === 'number'

function compare(a: Table['rows'][number][number], b: Table['rows'][number][number]): number {
  if (typeof a === 'number' && typeof b === 'number') return a - b
  return String(a ?? '').localeCompare(String(b ?? ''), 'en', { numeric: true })
}
