'use client'

import { useId } from 'react'
import { RefusedNote } from './refused-note'
import { NumberField } from '@/components/ui/number-field'
import { withUnit } from '@/lib/units/format'
import type { QuantityField } from '@/scene/session/field'
import { useBench, useSessionState } from '@/scene/session/react'

interface Props {
  field: QuantityField
  /** In a table, where a column head and a row name it: the note then stands elsewhere. */
  cell?: string
  onFocus?(): void
}

/** A figure of the document in a leaf: typed text goes to the session, what it refuses stays in the field. */
export function DocumentField({ field, cell, onFocus }: Props) {
  const { session } = useBench()
  const id = useId()
  const scene = useSessionState((state) => state.scene)
  const system = useSessionState((state) => state.system)
  const refusal = useSessionState((state) => state.refused[field.key])
  const understood = useSessionState((state) =>
    state.understood?.key === field.key ? state.understood.text : undefined,
  )
  const shown = field.show(scene, system)
  const input = (
    <NumberField
      id={id}
      look={cell ? 'wide' : 'box'}
      label={cell}
      text={shown.text}
      unit={shown.unit}
      placeholder={shown.text === '' ? '–' : undefined}
      refused={refusal?.text}
      understood={understood}
      describedBy={refusal ? noteId(field) : undefined}
      onText={(text) => session.enter(field, text)}
      onFocus={onFocus}
      onDone={session.seal}
      onEscape={() => session.drop(field.key)}
    />
  )
  if (cell) return input
  return (
    <div className="typed-field">
      <label htmlFor={id}>{field.label}</label>
      {input}
      <FieldRefusal field={field} />
    </div>
  )
}

const noteId = ({ key }: QuantityField) => `leaf-note-${key}`

/** What was refused of a field, and why. */
export function FieldRefusal({ field }: { field: QuantityField }) {
  const scene = useSessionState((state) => state.scene)
  const system = useSessionState((state) => state.system)
  const refusal = useSessionState((state) => state.refused[field.key])
  if (!refusal) return null
  const { text, unit } = field.show(scene, system)
  return (
    <RefusedNote id={noteId(field)} refusal={refusal} field={field} stands={text && withUnit(text, unit)} />
  )
}
