'use client'

import { useContext, useId, useMemo, useState } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { download, fileStem } from '@/components/ui/download'
import { useSlip } from '@/components/ui/slips'
import { StampContext } from '@/components/ui/stamp'
import { analysisTables } from '@/lib/sheet/analysis-tables'
import { tableCsv } from '@/lib/tables/csv'
import { tableJson, tablesJson } from '@/lib/tables/json'
import { useResults } from '@/scene/session/react'

/** Every table of the analysis as a file, one by one or all at once. */
export function FiguresSection() {
  const { analysis, document: train } = useResults()
  const stamp = useContext(StampContext)
  const slip = useSlip()
  const id = useId()
  const tables = useMemo(() => analysisTables(analysis), [analysis])
  const [title, setTitle] = useState(tables[0].title)
  const table = tables.find((each) => each.title === title) ?? tables[0]
  const save = (name: string, text: string, type: string) => {
    download(name, new Blob([text], { type }))
    slip({ text: `${name} is saved.` })
  }
  const stem = fileStem(table.title)
  const whole = `${fileStem(train.title)}-figures.json`
  return (
    <LeafSection title="Figures as files" at={`${tables.length} tables`} wide>
      <div className="paper-actions">
        <span className="lf paper-table">
          <label htmlFor={id}>Table</label>
          <span className="box">
            <select id={id} value={table.title} onChange={(event) => setTitle(event.target.value)}>
              {tables.map((each) => (
                <option key={each.title}>{each.title}</option>
              ))}
            </select>
          </span>
        </span>
        <span className="cap">
          {table.rows.length} rows:{' '}
          {table.columns.map(({ name, unit }) => (unit ? `${name}, ${unit}` : name)).join('; ')}
        </span>
      </div>
      <div className="paper-actions">
        <button
          type="button"
          className="btn"
          onClick={() => save(`${stem}.csv`, tableCsv(table, stamp()), 'text/csv')}
        >
          Save this table (CSV)
        </button>
        <button
          type="button"
          className="btn"
          onClick={() => save(`${stem}.json`, tableJson(table, stamp()), 'application/json')}
        >
          Save this table (JSON)
        </button>
        <button
          type="button"
          className="btn"
          onClick={() => save(whole, tablesJson(tables, stamp()), 'application/json')}
        >
          Save all tables (JSON)
        </button>
      </div>
      <p className="cap">
        Each file says which scene and version it is of, when it was written and by which method. Figures are
        unrounded.
      </p>
    </LeafSection>
  )
}
