'use client'

import { useId } from 'react'
import type { Role } from '@/lib/auth/access'
import { roleOptions } from './role-words'

interface Props {
  label: string
  value: Role
  /** Roles that are not to be had here. */
  without?: readonly Role[]
  onChange(role: Role): void
}

export function RoleField({ label, value, without = [], onChange }: Props) {
  const id = useId()
  const options = roleOptions.filter(({ role }) => !without.includes(role))
  return (
    <div className="lf">
      <label htmlFor={id}>{label}</label>
      <div className="box">
        <select
          id={id}
          value={value}
          aria-describedby={`${id}-words`}
          onChange={(event) => {
            const chosen = options.find(({ role }) => role === event.target.value)
            if (chosen) onChange(chosen.role)
          }}
        >
          {options.map(({ role }) => (
            <option key={role} value={role}>
              {role}
            </option>
          ))}
        </select>
      </div>
      <span className="cap" id={`${id}-words`}>
        {options.find(({ role }) => role === value)?.words}
      </span>
    </div>
  )
}
