'use client'

import { useId } from 'react'
import { Icon } from '@/components/ui/icon'
import { NumberField } from '@/components/ui/number-field'
import type { CrankTrain } from '@/scene/model/crank-train'
import type { Field } from '@/scene/session/field'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import { splitNames } from '@/scene/session/split-names'
import { FoldedRow } from './folded-row'
import type { Column, TableSpec } from './part-tables'
import { RefusedNote } from '@/components/figures/refused-note'

/** A list of the document, folded away in the parts list until it is wanted. */
export function PartTable({ table, number }: { table: TableSpec; number: number }) {
  const count = useSessionState((state) => state.scene.train[table.list].length)
  const bad = useSessionState((state) => Object.keys(state.refused).some((key) => belongs(table, key)))
  return (
    <FoldedRow row={table.key} number={number} label={table.label} count={count} bad={bad}>
      <TableBody table={table} />
    </FoldedRow>
  )
}

/** Fields of a table are named after its list: "throws.2.angleDeg". */
const belongs = (table: TableSpec, key: string) =>
  new RegExp(`^(${table.list}\\.\\d+\\.|${table.key}\\.)`).test(key) &&
  (key.startsWith(table.key) ||
    table.columns.some((column) => fieldOf(table, column, Number(key.split('.')[1])).key === key))

/** Any cell as a field: typed text in, changes of the document out. */
function fieldOf(table: TableSpec, column: Column, index: number): Field {
  const key = `${table.list}.${index}.${column.key}`
  const label = `${column.label}, ${table.label.toLowerCase()} ${index + 1}`
  switch (column.is) {
    case 'figure':
      return column.field(index)
    case 'name':
      return {
        key,
        label,
        read: (text, { train }) => ({
          ok: true,
          changes: [
            { path: ['train'], value: column.rename(train, train[table.list][index].id, text.trim()) },
          ],
        }),
      }
    case 'choice':
      return {
        key,
        label,
        read: (text, scene) => ({ ok: true, changes: column.changes(text, scene, index) }),
      }
    case 'names':
      return { key, label, read: (text) => ({ ok: true, changes: column.changes(splitNames(text), index) }) }
  }
}

function TableBody({ table }: { table: TableSpec }) {
  const { session } = useBench()
  const results = useResults()
  const train = useSessionState((state) => state.scene.train)
  const refused = useSessionState((state) => state.refused)
  const system = useSessionState((state) => state.system)
  const scene = useSessionState((state) => state.scene)
  const whole = (label: string, next: (train: CrankTrain) => CrankTrain): void => {
    const field: Field = {
      key: `${table.key}.change`,
      label,
      read: (_text, at) => ({ ok: true, changes: [{ path: ['train'], value: next(at.train) }] }),
    }
    session.enter(field, label)
    session.seal()
  }
  const notes = Object.values(refused).filter((refusal) => belongs(table, refusal.key))
  const items = train[table.list]
  return (
    <div className="subtable">
      <table>
        <thead>
          <tr>
            {table.columns.map((column) => (
              <th key={column.key} scope="col">
                {column.label}
                {column.is === 'figure' && items.length > 0 ? (
                  <span className="u"> {column.field(0).show(scene, system).unit}</span>
                ) : null}
              </th>
            ))}
            {table.remove ? <th scope="col">Take out</th> : null}
          </tr>
        </thead>
        <tbody>
          {items.map((item, index) => {
            const reason = table.held?.(train, index) ?? null
            return (
              <tr key={index}>
                {table.columns.map((column) => (
                  <td key={column.key}>
                    <Cell table={table} column={column} index={index} rowName={item.id} />
                  </td>
                ))}
                {table.remove ? (
                  <td>
                    <button
                      type="button"
                      className="btn sm ic"
                      aria-label={reason ? `Take out ${item.id}, ${reason}` : `Take out ${item.id}`}
                      title={reason ?? undefined}
                      disabled={reason !== null}
                      onClick={() => whole(`Take out ${item.id}`, (at) => table.remove!(at, index))}
                    >
                      <Icon name="cross" />
                    </button>
                  </td>
                ) : null}
              </tr>
            )
          })}
        </tbody>
      </table>
      {notes.map((refusal) => (
        <RefusedNote
          key={refusal.key}
          id={`note-${refusal.key}`}
          refusal={refusal}
          field={noteField(table, refusal.key)}
          stands="what it was"
        />
      ))}
      {table.add ? (
        <button
          type="button"
          className="btn sm"
          onClick={() => whole(table.add!.label, (at) => table.add!.change(at, results.eventsDeg))}
        >
          {table.add.label}
        </button>
      ) : null}
    </div>
  )
}

function noteField(table: TableSpec, key: string): Field {
  const index = Number(key.split('.')[1])
  const column = table.columns.find((candidate) => fieldOf(table, candidate, index).key === key)
  return column ? fieldOf(table, column, index) : { key, label: key, read: () => ({ ok: true, changes: [] }) }
}

function Cell({
  table,
  column,
  index,
  rowName,
}: {
  table: TableSpec
  column: Column
  index: number
  rowName: string
}) {
  const { session } = useBench()
  const id = useId()
  const scene = useSessionState((state) => state.scene)
  const system = useSessionState((state) => state.system)
  const field = fieldOf(table, column, index)
  const refusal = useSessionState((state) => state.refused[field.key])
  const understood = useSessionState(({ understood: of }) => (of?.key === field.key ? of.text : undefined))
  const { eventsDeg } = useResults()
  const label = `${column.label} of ${rowName}`
  if (column.is === 'choice')
    return (
      <select
        className="pick"
        aria-label={label}
        value={column.get(scene, index)}
        onChange={(event) => {
          session.enter(field, event.target.value)
          session.seal()
        }}
      >
        {column.options(scene, index).map((option) => (
          <option key={option}>{option}</option>
        ))}
      </select>
    )
  const text =
    column.is === 'name'
      ? rowName
      : column.is === 'names'
        ? column.get(scene, index)
        : column.field(index).show(scene, system).text
  return (
    <NumberField
      id={id}
      look="wide"
      label={label}
      text={text}
      placeholder={(column.is === 'figure' && column.otherwise?.(rowName, eventsDeg)) || '–'}
      understood={understood}
      refused={refusal?.text}
      describedBy={refusal ? `note-${field.key}` : undefined}
      onText={(next) => session.enter(field, next)}
      onDone={session.seal}
      onEscape={() => session.drop(field.key)}
    />
  )
}
