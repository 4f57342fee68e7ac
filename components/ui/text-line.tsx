'use client'

import { useId, type InputHTMLAttributes } from 'react'

interface Props extends Omit<InputHTMLAttributes<HTMLInputElement>, 'onChange' | 'value'> {
  label: string
  value: string
  hint?: string
  bad?: boolean
  onChange(value: string): void
}

/** One line of text with its label over it. */
export function TextLine({ label, value, hint, bad, onChange, ...input }: Props) {
  const id = useId()
  return (
    <div className="lf">
      <label htmlFor={id}>{label}</label>
      <div className={bad ? 'box bad' : 'box'}>
        <input
          {...input}
          id={id}
          value={value}
          aria-invalid={bad || undefined}
          aria-describedby={hint ? `${id}-hint` : undefined}
          onChange={(event) => onChange(event.target.value)}
        />
      </div>
      {hint ? (
        <span className="cap" id={`${id}-hint`}>
          {hint}
        </span>
      ) : null}
    </div>
  )
}
