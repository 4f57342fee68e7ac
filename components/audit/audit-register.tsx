'use client'

import { useMemo, useState } from 'react'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import type { AuditFilters as Wanted } from '@/lib/contracts/audit-log'
import { AuditFilters, everything, type Chosen } from './audit-filters'
import { changedWords } from './changed-words'
import { auditAddress, useAudit } from './use-audit'

interface Props {
  workshop: { id: string; name: string }
  people: readonly { id: string; name: string }[]
}

const when = new Intl.DateTimeFormat('en-GB', {
  ...{
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
  },
  timeZoneName: 'short',
})

/** Days begin and end where the viewer is. */
function wantedOf({ actor, area, from, to }: Chosen): Wanted {
  const midnight = (day: string, later: number) => {
    const [year, month, date] = day.split('-').map(Number)
    return new Date(year, month - 1, date + later).toISOString()
  }
  return {
    actor: actor || undefined,
    operation: area || undefined,
    from: from ? midnight(from, 0) : undefined,
    to: to ? midnight(to, 1) : undefined,
  }
}

/** Who did what, and when; what was before and after. Nothing here can be changed. */
export function AuditRegister({ workshop, people }: Props) {
  const [chosen, setChosen] = useState(everything)
  const wanted = useMemo(() => wantedOf(chosen), [chosen])
  const { entries, error, more } = useAudit(workshop.id, wanted)
  return (
    <>
      <section className="reg audit" aria-label="Audit log">
        <AuditFilters chosen={chosen} people={people} onChange={setChosen} />
        {error ? (
          <p className="msg refused" role="alert">
            {error.message}
          </p>
        ) : entries === null ? (
          <p className="setting-out">Setting out</p>
        ) : entries.length === 0 ? (
          <p className="cap">
            Nothing of this kind was done in this time. Choose other people, days or things.
          </p>
        ) : (
          <div className="twin" tabIndex={0} role="region" aria-label="Entries">
            <table className="tab">
              <thead>
                <tr>
                  {['When', 'Who', 'Did what', 'To', 'Before and after'].map((head) => (
                    <th scope="col" key={head}>
                      {head}
                    </th>
                  ))}
                </tr>
              </thead>
              <tbody>
                {entries.map((entry) => (
                  <tr key={entry.id}>
                    <th scope="row">{when.format(new Date(entry.at))}</th>
                    <td>{entry.actor?.name ?? 'nobody signed in'}</td>
                    <td>{entry.operation}</td>
                    <td className="audit-subject">{entry.subject}</td>
                    <td>
                      <ul className="audit-changes">
                        {changedWords(entry.before, entry.after).map((words) => (
                          <li key={words}>{words}</li>
                        ))}
                      </ul>
                    </td>
                  </tr>
                ))}
              </tbody>
            </table>
          </div>
        )}
        {more ? (
          <button type="button" className="btn sm" onClick={more}>
            Earlier ones
          </button>
        ) : null}
      </section>
      <TitleBlock>
        <TitleCell k="Record of the workshop" span={6} first top>
          <h1 className="v title">Audit log</h1>
        </TitleCell>
        <TitleCell k="Workshop" span={6} first>
          <span className="v">{workshop.name}</span>
        </TitleCell>
        <TitleActions note="What is listed, as a file.">
          <a className="btn" href={auditAddress(workshop.id, '.json', wanted)} download>
            Save as JSON
          </a>
          <a className="btn" href={auditAddress(workshop.id, '.csv', wanted)} download>
            Save as CSV
          </a>
        </TitleActions>
      </TitleBlock>
    </>
  )
}
