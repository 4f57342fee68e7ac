'use client'

import { formatNumber } from '@/lib/units/format'
import { useResults } from '@/scene/session/react'
import { Note } from './note'

const degrees = (values: readonly number[]) =>
  values
    .map((value) => formatNumber(value, { decimals: Math.abs(value - Math.round(value)) < 0.05 ? 0 : 1 }))
    .join('-')

/** "8 × 90", where all are alike. */
const said = (values: readonly number[], even: boolean) =>
  even && values.length > 2 ? `${values.length} × ${degrees([values[0]])}` : degrees(values)

/** Intervals of the engine, of each bank and of each collector, and whether they are even. */
export function FiringNotes() {
  const { analysis, document } = useResults()
  const { firing } = analysis
  const single = document.cylinders.length === 1
  const rows = [
    { name: 'Engine', ...firing },
    ...(document.banks.length > 1
      ? Object.entries(firing.banks).map(([id, bank]) => ({ name: `Bank ${id}`, ...bank }))
      : []),
    ...Object.entries(firing.collectors).map(([id, collector]) => ({
      name: `Collector ${id}`,
      ...collector,
    })),
  ]
  return (
    <Note title="Firing intervals" at="degrees">
      <table className="otab firing-table">
        <tbody>
          {rows.map(({ name, intervalsDeg, even }) => (
            <tr key={name}>
              <th scope="row">{name}</th>
              <td>{said(intervalsDeg, even)}</td>
              <td className="word">{single ? '' : even ? 'even' : 'uneven'}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {document.banks.length > 1 ? (
        <p className="say">
          {firing.alternatesBanks
            ? 'The order changes bank at every firing.'
            : 'Some bank fires twice in a row.'}
        </p>
      ) : null}
    </Note>
  )
}
