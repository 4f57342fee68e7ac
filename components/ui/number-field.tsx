'use client'

import { useState } from 'react'

interface Props {
  id: string
  /** The value as it is written when nobody is typing. */
  text: string
  unit?: string
  /** Text that was typed and refused: it stays in the field until it is mended. */
  refused?: string
  /** What was understood, beside the field, where it is not plain from the text. */
  understood?: string
  describedBy?: string
  /** A boxed field with its unit in a cell of its own, or a line in a table. */
  look?: 'line' | 'box' | 'wide'
  label?: string
  placeholder?: string
  onText(text: string): void
  onFocus?(): void
  /** Leaving the field, or Enter: what follows is a new step. */
  onDone?(): void
  onEscape?(): void
}

/**
 * A field for a figure. It keeps what is being typed, letter for letter: the sheet's own way of writing the value
 * returns only when the field is left.
 */
export function NumberField(props: Props) {
  const { id, text, unit = '', refused, understood, describedBy, look = 'line', label, placeholder } = props
  const [typed, setTyped] = useState<string | null>(null)
  const bad = refused !== undefined
  const input = (
    <input
      id={id}
      value={typed ?? refused ?? text}
      placeholder={placeholder}
      inputMode="text"
      autoComplete="off"
      spellCheck={false}
      aria-label={label}
      aria-invalid={bad || undefined}
      aria-describedby={describedBy}
      onFocus={(event) => {
        event.target.select()
        props.onFocus?.()
      }}
      onChange={(event) => {
        setTyped(event.target.value)
        props.onText(event.target.value)
      }}
      onBlur={() => {
        setTyped(null)
        props.onDone?.()
      }}
      onKeyDown={(event) => {
        if (event.key === 'Enter') {
          setTyped(null)
          props.onDone?.()
        } else if (event.key === 'Escape') {
          setTyped(null)
          props.onEscape?.()
        }
      }}
    />
  )
  const beside = understood ? <span className="und fig">{understood}</span> : null
  const unitCell = unit || look !== 'box' ? <span className="u">{unit}</span> : null
  if (look === 'box')
    return (
      <div className={bad ? 'box num bad' : 'box num'}>
        {input}
        {beside}
        {unitCell}
      </div>
    )
  return (
    <span className={`f${look === 'wide' ? ' wide' : ''}${bad ? ' bad' : ''}`}>
      {beside}
      {input}
      {unitCell}
    </span>
  )
}
