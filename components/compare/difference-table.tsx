'use client'

import { useMemo } from 'react'
import { SaveFiles } from '@/components/ui/save-files'
import type { Table } from '@/lib/tables/table'
import { scaleFor, type System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import { compareTrains, differences, type Compared, type DifferenceRow } from '@/scene/model/compare-trains'

interface Props {
  compared: readonly Compared[]
  system: System
}

/** Only the rows that differ as shown, by group; neither side is called the better one. */
export function DifferenceTable({ compared, system }: Props) {
  const groups = useMemo(() => compareTrains(compared), [compared])
  const shown = useMemo(() => differences(groups, system), [groups, system])
  const all = groups.reduce((sum, { rows }) => sum + rows.length, 0)
  const different = shown.reduce((sum, { rows }) => sum + rows.length, 0)
  const table = useMemo(() => tableOf(shown, compared), [shown, compared])
  return (
    <>
      <p className="read" role="status">
        {different === 0
          ? `All ${all} figures are the same as shown.`
          : `${different} of ${all} figures differ; the others are the same as shown and left out.`}
      </p>
      {different > 0 ? (
        <div className="compare-table" role="region" aria-label="What differs" tabIndex={0}>
          <table className="otab">
            <thead>
              <tr>
                <th scope="col">What differs</th>
                {compared.map(({ document }, i) => (
                  <th key={i} scope="col">
                    {i + 1}. {document.title}
                  </th>
                ))}
                <th scope="col">Unit</th>
              </tr>
            </thead>
            {shown.map(({ title, rows }) => (
              <tbody key={title}>
                <tr className="compare-group">
                  <th colSpan={compared.length + 2} scope="colgroup">
                    {title}
                  </th>
                </tr>
                {rows.map(({ name, texts, unit, quantity }) => (
                  <tr key={name} className="line">
                    <th scope="row">{name}</th>
                    {texts.map((text, i) => (
                      <td key={i} className={quantity ? undefined : 'compare-words'}>
                        {text}
                      </td>
                    ))}
                    <td className="word">{unit}</td>
                  </tr>
                ))}
              </tbody>
            ))}
          </table>
        </div>
      ) : null}
      {different > 0 ? <SaveFiles table={table} /> : null}
    </>
  )
}

/** For files: the same rows with their figures unrounded and in SI units. */
function tableOf(
  groups: readonly { title: string; rows: DifferenceRow[] }[],
  compared: readonly Compared[],
): Table {
  const unitOf = ({ quantity, values }: DifferenceRow) => {
    const most = Math.max(0, ...values.map((each) => (typeof each === 'number' ? Math.abs(each) : 0)))
    return quantity ? scaleFor(most, quantity, 'si').unit : ''
  }
  const value = (row: DifferenceRow, i: number) => {
    const found = row.values[i]
    return typeof found === 'number' ? fromSi(found, unitOf(row)) : found
  }
  return {
    title: 'Engines compared',
    columns: [
      { name: 'Group', unit: '' },
      { name: 'Figure', unit: '' },
      ...compared.map(({ document, speedRpm }, i) => ({
        name: `${i + 1}. ${document.title} at ${Math.round(speedRpm)} rpm`,
        unit: '',
      })),
      { name: 'Unit', unit: '' },
    ],
    rows: groups.flatMap(({ title, rows }) =>
      rows.map((row) => [title, row.name, ...compared.map((_, i) => value(row, i)), unitOf(row)]),
    ),
  }
}
