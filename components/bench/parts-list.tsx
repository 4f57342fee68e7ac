'use client'

import { Fragment, useMemo } from 'react'
import { Icon, StatusMark } from '@/components/ui/icon'
import { useBench, useSessionState } from '@/scene/session/react'
import { acknowledgementOf, type Doubt } from '@/scene/model/doubts'
import { standingDoubts } from '@/scene/session/standing'
import { DoubtRows } from './doubt-rows'
import { PartRow } from './part-row'
import { numberedRows, rowKey } from './part-rows'
import { rowOfPath } from './row-of-path'
import { UnitsSwitch } from './units-switch'

interface Props {
  onPresets(): void
  onSetOut(): void
  onDownload(): void
  onFile(file: File): void
}

/** Inputs: everything that describes the train, with the refused values gathered at the top. */
export function PartsList({ onPresets, onSetOut, onDownload, onFile }: Props) {
  const { session } = useBench()
  const scene = useSessionState((state) => state.scene)
  const refused = useSessionState((state) => state.refused)
  const canUndo = useSessionState((state) => state.past.length > 0 || Object.keys(state.refused).length > 0)
  const canRedo = useSessionState((state) => state.future.length > 0)
  const groups = useMemo(() => numberedRows(scene), [scene])
  const system = useSessionState((state) => state.system)
  const doubts = useMemo(() => {
    const rows = groups.flatMap((group) => group.rows)
    const last = rows.at(-1)!
    const byRow = new Map<string, Doubt[]>()
    for (const doubt of standingDoubts(scene.train, system)) {
      const key = rowOfPath(doubt.path, rows, scene) ?? rowKey(last.row)
      byRow.set(key, [...(byRow.get(key) ?? []), doubt])
    }
    return byRow
  }, [groups, scene, system])
  const open = [...doubts].flatMap(([key, list]) =>
    list.filter((doubt) => !acknowledgementOf(scene.train, doubt)).map((doubt) => ({ key, doubt })),
  )
  const held = Object.values(refused)
  return (
    <section className="list" aria-label="Parts list">
      <div className="listhead">
        <h2>Parts list</h2>
        <button
          type="button"
          className="btn sm ic"
          aria-label="Undo"
          disabled={!canUndo}
          onClick={session.undo}
        >
          <Icon name="undo" />
        </button>
        <button
          type="button"
          className="btn sm ic"
          aria-label="Redo"
          disabled={!canRedo}
          onClick={session.redo}
        >
          <Icon name="redo" />
        </button>
        <button type="button" className="btn sm" onClick={onSetOut}>
          Set out…
        </button>
        <button type="button" className="btn sm" onClick={onPresets}>
          Presets…
        </button>
      </div>
      <div className="listnotes">
        {held.length > 0 ? (
          <p className="held" role="status">
            Not taken, the drawing keeps the last value:{' '}
            {held.map((refusal) => (
              <a
                key={refusal.key}
                href={`#row-${refusal.key}`}
                onClick={(event) => {
                  event.preventDefault()
                  focusRow(refusal.key)
                }}
              >
                {refusal.label}
              </a>
            ))}
          </p>
        ) : null}
        {open.length > 0 ? (
          <p className="held unusual">
            <span className="st mon">
              <StatusMark kind="monitor" /> {open.length} unusual:
            </span>{' '}
            {open.map(({ key, doubt }) => (
              <a
                key={`${doubt.code} ${doubt.path}`}
                href={`#row-${key}`}
                onClick={(event) => {
                  event.preventDefault()
                  focusRow(key)
                }}
              >
                {doubt.head.replace(/\.$/, '')}
              </a>
            ))}
          </p>
        ) : null}
      </div>
      <div className="parts-scroll">
        <table className="parts">
          <thead>
            <tr>
              <th className="no" scope="col">
                No.
              </th>
              <th scope="col">Part</th>
              <th className="val r" scope="col">
                <span className="val-head">Value</span>
              </th>
              <th className="src" scope="col">
                Source
              </th>
            </tr>
          </thead>
          {groups.map(({ name, rows }) => (
            <tbody key={name}>
              <tr className="grp">
                <th colSpan={4} scope="colgroup">
                  {name}
                </th>
              </tr>
              {rows.map((numbered) => {
                const key = rowKey(numbered.row)
                const unusual = doubts.get(key) ?? []
                return (
                  <Fragment key={key}>
                    <PartRow {...numbered} unusual={unusual.length > 0} />
                    <DoubtRows row={key} doubts={unusual} />
                  </Fragment>
                )
              })}
            </tbody>
          ))}
        </table>
      </div>
      <div className="listfoot">
        <span className="cap grow desk-only">As a file</span>
        {/* On a phone the title block has room for the title and the actions alone. */}
        <span className="phone-only grow">
          <UnitsSwitch />
        </span>
        <label className="btn sm">
          Bring in…
          <input
            className="vh"
            type="file"
            accept=".json,application/json"
            onChange={(event) => {
              const [file] = event.target.files ?? []
              event.target.value = ''
              if (file) onFile(file)
            }}
          />
        </label>
        <button type="button" className="btn sm" onClick={onDownload}>
          Download
        </button>
      </div>
    </section>
  )
}

/** Brings the row of a field into view and puts the cursor in it. */
export function focusRow(key: string): void {
  const row =
    document.querySelector(`[data-row="${CSS.escape(key)}"]`) ??
    document.querySelector('.subtable [aria-invalid]')
  const field = row?.matches('input') ? row : row?.querySelector('input, select, textarea, button')
  if (field instanceof HTMLElement) field.focus()
  row?.scrollIntoView({ block: 'center' })
}
