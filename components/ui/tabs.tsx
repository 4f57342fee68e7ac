'use client'

import { useId, useRef, type KeyboardEvent, type ReactNode } from 'react'

interface Props<T extends string> {
  label: string
  value: T
  tabs: { value: NoInfer<T>; label: string }[]
  onChange(value: NoInfer<T>): void
  children: ReactNode
}

/** The row of datum tabs alone: the current word stands on the datum triangle. Panels are named by `panelId`. */
export function TabList<T extends string>({
  id,
  label,
  value,
  tabs,
  onChange,
}: Omit<Props<T>, 'children'> & { id: string }) {
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
    <div ref={list} className="datum" role="tablist" aria-label={label} onKeyDown={move}>
      {tabs.map((tab) => (
        <button
          key={tab.value}
          type="button"
          role="tab"
          id={`${id}-${tab.value}`}
          aria-controls={panelId(id)}
          aria-selected={tab.value === value}
          tabIndex={tab.value === value ? 0 : -1}
          onClick={() => onChange(tab.value)}
        >
          {tab.label}
        </button>
      ))}
    </div>
  )
}

export const panelId = (id: string) => `${id}-panel`

/** Datum tabs over the current panel. */
export function Tabs<T extends string>({ children, ...tabs }: Props<T>) {
  const id = useId()
  return (
    <>
      <TabList id={id} {...tabs} />
      <div className="datum-panel" role="tabpanel" id={panelId(id)} aria-labelledby={`${id}-${tabs.value}`}>
        {children}
      </div>
    </>
  )
}
