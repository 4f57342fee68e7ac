'use client'

import { useRef, useState, type FocusEvent, type KeyboardEvent, type ReactNode } from 'react'

interface Props {
  zone: number
  /** Whose things it opens: a workshop, a person. */
  label: string
  current: boolean
  children: ReactNode
}

/** A zone of the upper edge that opens a few lines under it. Escape, and going elsewhere, closes it. */
export function EdgeMenu({ zone, label, current, children }: Props) {
  const [open, setOpen] = useState(false)
  const button = useRef<HTMLButtonElement>(null)
  const leave = (event: FocusEvent) => {
    if (!event.currentTarget.contains(event.relatedTarget)) setOpen(false)
  }
  const key = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || !open) return
    setOpen(false)
    button.current?.focus()
  }
  return (
    <div className={`zone-${zone} edge-menu`} onBlur={leave} onKeyDown={key}>
      <button
        ref={button}
        type="button"
        className={current ? 'is-current' : undefined}
        aria-expanded={open}
        title={label}
        onClick={() => setOpen(!open)}
      >
        <span className="z" aria-hidden="true">
          {zone}
        </span>
        <span className="edge-name">{label}</span>
      </button>
      {open ? <div className="edge-panel">{children}</div> : null}
    </div>
  )
}
