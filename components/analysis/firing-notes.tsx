'use client'

import { useResults } from '@/scene/session/react'
import { BehindFigure } from '@/components/figures/behind'
import { intervalWords } from '@/components/figures/interval-words'
import { Note } from '@/components/figures/note'

/** Intervals of the engine, of each bank and of each collector, and whether they are even. */
export function FiringNotes() {
  const { analysis, document } = useResults()
  const { firing } = analysis
  const single = document.cylinders.length === 1
  const rows = [
    { name: 'Engine', of: {}, ...firing },
    ...(document.banks.length > 1
      ? Object.entries(firing.banks).map(([id, bank]) => ({ name: `Bank ${id}`, of: { bank: id }, ...bank }))
      : []),
    ...Object.entries(firing.collectors).map(([id, collector]) => ({
      name: `Collector ${id}`,
      of: { collector: id },
      ...collector,
    })),
  ]
  return (
    <Note title="Firing intervals" at="degrees">
      <table className="otab firing-table">
        <tbody>
          {rows.map(({ name, of, intervalsDeg, even }) => (
            <tr key={name}>
              <th scope="row">{name}</th>
              <td>
                <BehindFigure
                  behind={{ figure: 'firing-evenness', ...of }}
                  label={`${name}, intervals ${intervalWords(intervalsDeg, even)}`}
                >
                  {intervalWords(intervalsDeg, even)}
                </BehindFigure>
              </td>
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
