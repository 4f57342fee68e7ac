'use client'

import { useId, useRef, type KeyboardEvent, type ReactNode } from 'react'

interface Props<T extends string> {
  label: string
  value: T
  tabs: { value: NoInfer<T>; label: string }[]
  onChange(value: NoInfer<T>): void
  children: ReactNode
}

/** Datum tabs: the current word stands on the datum triangle. The children are the current panel. */
export function Tabs<T extends string>({ label, value, tabs, onChange, children }: Props<T>) {
  const id = useId()
  const list = useRef<HTMLDivElement>(null)
  const move = (event: KeyboardEvent) => {
    const at = tabs.findIndex((tab) => tab.value === value)
    const to = { ArrowRight: at + 1, ArrowLeft: at - 1, Home: 0, End: tabs.length - 1 }[event.key]
    if (to === undefined) return
    event.preventDefault()
    const next = (to + tabs.length) % tabs.length
    onChange(tabs[next].value)
    list.current?.querySelectorAll('button')[next].focus()
  }
  return (
    <>
      <div ref={list} className="datum" role="tablist" aria-label={label} onKeyDown={move}>
        {tabs.map((tab) => (
          <button
            key={tab.value}
            type="button"
            role="tab"
            id={`${id}-${tab.value}`}
            aria-controls={`${id}-panel`}
            aria-selected={tab.value === value}
            tabIndex={tab.value === value ? 0 : -1}
            onClick={() => onChange(tab.value)}
          >
            {tab.label}
          </button>
        ))}
      </div>
      <div className="datum-panel" role="tabpanel" id={`${id}-panel`} aria-labelledby={`${id}-${value}`}>
        {children}
      </div>
    </>
  )
}
