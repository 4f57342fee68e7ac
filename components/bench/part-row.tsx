'use client'

import { useId, type ReactNode } from 'react'
import { NumberField } from '@/components/ui/number-field'
import { withUnit } from '@/lib/units/format'
import { useBench, useSessionState } from '@/scene/session/react'
import type { Field } from '@/scene/session/field'
import type { Scene } from '@/scene/model/scene'
import { doubtsId } from './doubt-rows'
import { PartTable } from './part-table'
import { RefusedNote } from '@/components/figures/refused-note'
import type { ChoiceSpec, NumberedRow } from './part-rows'
import { LockRow } from './lock-row'
import { exceptions } from './own-fields'
import { TraceRow } from './trace-row'
import { UnequalParts } from './unequal-parts'

interface Props extends NumberedRow {
  /** Words about its value stand below it. */
  unusual?: boolean
}

/** One line of the parts list: its balloon, the part, the value and where the value comes from. */
export function PartRow({ row, number, unusual }: Props) {
  switch (row.is) {
    case 'figure':
    case 'text':
      return <ValueRow row={row} number={number} unusual={unusual} />
    case 'choice':
      return <ChoiceRow choice={row.choice} number={number} />
    case 'table':
      return <PartTable table={row.table} number={number} />
    case 'trace':
      return <TraceRow number={number} />
    case 'unequal':
      return <UnequalParts number={number} />
    case 'lock':
      return <LockRow lock={row.lock} number={number} />
  }
}

function Line(props: {
  rowId: string
  number: number
  ringed: boolean
  bad: boolean
  label: ReactNode
  children: ReactNode
}) {
  const { session } = useBench()
  const on = useSessionState((state) => state.lit === props.rowId)
  return (
    <tr
      className={props.bad ? 'bad' : on ? 'on' : props.ringed ? undefined : 'free'}
      data-row={props.rowId}
      onMouseEnter={() => session.light(props.rowId)}
      onMouseLeave={() => session.light(null)}
      onFocus={() => session.light(props.rowId)}
      onBlur={() => session.light(null)}
    >
      <td className="no">
        <span className="ball">{props.number}</span>
      </td>
      <th scope="row">{props.label}</th>
      {props.children}
    </tr>
  )
}

function ValueRow({
  row,
  number,
  unusual,
}: Props & { row: Extract<NumberedRow['row'], { is: 'figure' | 'text' }> }) {
  const { session } = useBench()
  const scene = useSessionState((state) => state.scene)
  const system = useSessionState((state) => state.system)
  const base = useSessionState((state) => state.base)
  const refusal = useSessionState((state) => state.refused[row.field.key])
  const understood = useSessionState((state) =>
    state.understood?.key === row.field.key ? state.understood.text : undefined,
  )
  const id = useId()
  const wide = row.is === 'text'
  const shown =
    row.is === 'text' ? { text: row.field.show(scene), unit: row.unit ?? '' } : row.field.show(scene, system)
  const field: Field = row.field
  const note = `${id}-note`
  const except = row.is === 'figure' ? exceptions(scene.train, row.field) : []
  return (
    <>
      <Line
        rowId={field.key}
        number={number}
        ringed={Boolean(row.kinds?.length)}
        bad={Boolean(refusal)}
        label={
          <>
            <label htmlFor={id}>{field.label}</label>
            {except.length > 0 ? <span className="cap"> except {except.join(', ')}</span> : null}
          </>
        }
      >
        <td className={wide ? 'val wideval' : 'val'} colSpan={wide ? 2 : 1}>
          <NumberField
            id={id}
            look={wide ? 'wide' : 'line'}
            text={shown.text}
            unit={shown.unit}
            placeholder={shown.text === '' ? '–' : undefined}
            refused={refusal?.text}
            understood={understood}
            describedBy={refusal ? note : unusual ? doubtsId(field.key) : undefined}
            onText={(text) => session.enter(field, text)}
            onDone={session.seal}
            onEscape={() => session.drop(field.key)}
          />
        </td>
        {wide ? null : <td className="src">{refusal ? 'typed' : sourceWord(row.field, scene, base)}</td>}
      </Line>
      {refusal ? (
        <tr className="err">
          <td colSpan={4}>
            <RefusedNote
              id={note}
              refusal={refusal}
              field={field}
              stands={withUnit(shown.text, shown.unit)}
            />
          </td>
        </tr>
      ) : null}
    </>
  )
}

function sourceWord(
  field: Extract<NumberedRow['row'], { is: 'figure' }>['field'] | Field,
  scene: Scene,
  base: { train: Scene['train']; word: string },
): string {
  if (!('get' in field)) return ''
  const value = field.get(scene)
  if (value === undefined) return ''
  return value === field.get({ ...scene, train: base.train }) ? base.word : 'typed'
}

function ChoiceRow({ choice, number }: { choice: ChoiceSpec; number: number }) {
  const { session } = useBench()
  const scene = useSessionState((state) => state.scene)
  const refusal = useSessionState((state) => state.refused[choice.key])
  const id = useId()
  const value = choice.get(scene)
  const options = typeof choice.options === 'function' ? choice.options(scene) : choice.options
  const field: Field = {
    key: choice.key,
    label: choice.label,
    read: (text, at) => ({ ok: true, changes: choice.changes(text, at) }),
  }
  return (
    <>
      <Line
        rowId={choice.key}
        number={number}
        ringed={false}
        bad={Boolean(refusal)}
        label={<label htmlFor={id}>{choice.label}</label>}
      >
        <td className="val wideval" colSpan={2}>
          <select
            id={id}
            className="pick"
            value={value}
            onChange={(event) => {
              session.enter(field, event.target.value)
              session.seal()
            }}
          >
            {options.map((option) => (
              <option key={option.value} value={option.value}>
                {option.label}
              </option>
            ))}
          </select>
        </td>
      </Line>
      {refusal ? (
        <tr className="err">
          <td colSpan={4}>
            <RefusedNote
              id={`${id}-note`}
              refusal={refusal}
              field={field}
              stands={options.find((option) => option.value === value)?.label ?? value}
            />
          </td>
        </tr>
      ) : null}
    </>
  )
}
