'use client'

import { operations } from '@/lib/auth/access'

/** As somebody chose them; days as they stand in a date field. */
export interface Chosen {
  actor: string
  area: string
  from: string
  to: string
}

export const everything: Chosen = { actor: '', area: '', from: '', to: '' }

const areas = [
  ...new Set([...operations.map((operation) => operation.split('.')[0]), 'password', 'export']),
].sort()

interface Props {
  chosen: Chosen
  people: readonly { id: string; name: string }[]
  onChange(chosen: Chosen): void
}

/** Whose entries, of what, and from when to when: all of them until something is chosen. */
export function AuditFilters({ chosen, people, onChange }: Props) {
  const choice = (
    name: 'actor' | 'area',
    label: string,
    options: readonly { value: string; text: string }[],
  ) => (
    <label className="lf">
      {label}
      <span className="box sel">
        <select value={chosen[name]} onChange={({ target }) => onChange({ ...chosen, [name]: target.value })}>
          <option value="">all</option>
          {options.map(({ value, text }) => (
            <option value={value} key={value}>
              {text}
            </option>
          ))}
        </select>
      </span>
    </label>
  )
  const day = (name: 'from' | 'to', label: string) => (
    <label className="lf">
      {label}
      <span className="box">
        <input
          type="date"
          value={chosen[name]}
          onChange={({ target }) => onChange({ ...chosen, [name]: target.value })}
        />
      </span>
    </label>
  )
  return (
    <div className="audit-filters" role="group" aria-label="What is listed">
      {choice(
        'actor',
        'Person',
        people.map(({ id, name }) => ({ value: id, text: name })),
      )}
      {choice(
        'area',
        'About',
        areas.map((area) => ({ value: area, text: area })),
      )}
      {day('from', 'From')}
      {day('to', 'To, with that day')}
    </div>
  )
}
