'use client'

import { useId, useRef, useState, type KeyboardEvent } from 'react'
import { matching, mentionAt } from './mentions'
import type { Colleague } from './use-colleagues'

interface Props {
  label: string
  value: string
  onChange(value: string): void
  people: readonly Colleague[]
  rows?: number
  maxLength: number
  describedBy?: string
  refused?: boolean
}

/** Several lines of words. An @ lists the people of the workshop: arrows choose, Enter takes, Escape leaves it as typed. */
export function WordsField(props: Props) {
  const { label, value, onChange, people, rows = 2, maxLength, describedBy, refused } = props
  const id = useId()
  const field = useRef<HTMLTextAreaElement>(null)
  const [asked, setAsked] = useState<{ from: number; typed: string } | null>(null)
  const [at, setAt] = useState(0)
  const offered = asked ? matching(people, asked.typed).slice(0, 8) : []
  const open = offered.length > 0
  const chosen = Math.min(at, offered.length - 1)

  const look = () => {
    const { selectionStart, value: text } = field.current!
    setAsked(mentionAt(text, selectionStart))
    setAt(0)
  }
  const take = ({ name }: Colleague) => {
    if (!asked) return
    const before = `${value.slice(0, asked.from)}@${name} `
    onChange(before + value.slice(asked.from + 1 + asked.typed.length))
    setAsked(null)
    requestAnimationFrame(() => {
      field.current?.focus()
      field.current?.setSelectionRange(before.length, before.length)
    })
  }
  const key = (event: KeyboardEvent) => {
    if (!open) return
    const by = { ArrowDown: 1, ArrowUp: -1 }[event.key]
    if (by) setAt((chosen + by + offered.length) % offered.length)
    else if (event.key === 'Enter' || event.key === 'Tab') take(offered[chosen])
    else if (event.key === 'Escape') setAsked(null)
    else return
    event.preventDefault()
    event.stopPropagation()
  }
  return (
    <div className="lf words">
      <label htmlFor={id}>{label}</label>
      <div className={refused ? 'box bad' : 'box'}>
        <textarea
          ref={field}
          id={id}
          rows={rows}
          value={value}
          maxLength={maxLength}
          aria-autocomplete="list"
          aria-haspopup="listbox"
          aria-controls={open ? `${id}-people` : undefined}
          aria-activedescendant={open ? `${id}-${chosen}` : undefined}
          aria-describedby={describedBy}
          aria-invalid={refused || undefined}
          onChange={(event) => {
            onChange(event.target.value)
            look()
          }}
          onKeyDown={key}
          onClick={look}
          onBlur={() => setAsked(null)}
        />
      </div>
      {open ? (
        <ul className="mentions" role="listbox" id={`${id}-people`} aria-label="People of the workshop">
          {offered.map((person, i) => (
            <li
              key={person.id}
              id={`${id}-${i}`}
              role="option"
              aria-selected={i === chosen}
              onPointerDown={(event) => {
                event.preventDefault()
                take(person)
              }}
            >
              <span>{person.name}</span>
              <span className="cap">{person.role}</span>
            </li>
          ))}
        </ul>
      ) : null}
    </div>
  )
}
