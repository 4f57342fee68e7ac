'use client'

import { useRef, type KeyboardEvent } from 'react'

interface Props<T extends string> {
  label: string
  value: T
  options: { value: NoInfer<T>; label: string }[]
  onChange(value: NoInfer<T>): void
  className?: string
}

/** One of a few, all in view. Arrow keys move the choice, as in any group of radio buttons. */
export function Segmented<T extends string>({ label, value, options, onChange, className }: Props<T>) {
  const group = useRef<HTMLSpanElement>(null)
  const move = (event: KeyboardEvent) => {
    const by = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key]
    if (!by) return
    event.preventDefault()
    const at = options.findIndex((option) => option.value === value)
    const next = (at + by + options.length) % options.length
    onChange(options[next].value)
    group.current?.querySelectorAll('button')[next].focus()
  }
  return (
    <span
      ref={group}
      className={className ? `two ${className}` : 'two'}
      role="radiogroup"
      aria-label={label}
      onKeyDown={move}
    >
      {options.map((option) => (
        <button
          key={option.value}
          type="button"
          role="radio"
          aria-checked={option.value === value}
          tabIndex={option.value === value ? 0 : -1}
          onClick={() => onChange(option.value)}
        >
          {option.label}
        </button>
      ))}
    </span>
  )
}
