'use client'

import type { Operation, Role } from '@/lib/auth/access'
import type { Member } from '@/lib/contracts/workshops'
import { dayOf } from '@/components/ui/times'
import { roleOptions } from './role-words'

interface Props {
  people: Member[]
  may: readonly Operation[]
  /** Why the only owner keeps the role and the place; null where there are more. */
  held: string | null
  onRole(person: Member, role: Role): void
  onRemove(person: Member): void
}

export function PeopleTable({ people, may, held, onRole, onRemove }: Props) {
  const removes = may.includes('person.remove')
  return (
    <table className="roll">
      <thead>
        <tr>
          <th scope="col">Name</th>
          <th scope="col">Mail address</th>
          <th scope="col">Role</th>
          <th scope="col">Here since</th>
          {removes ? (
            <th scope="col">
              <span className="vh">Actions</span>
            </th>
          ) : null}
        </tr>
      </thead>
      <tbody>
        {people.map((person) => {
          const reason = person.role === 'owner' ? held : null
          return (
            <tr key={person.id}>
              <th scope="row">
                {person.name}
                {person.you ? <span className="cap">you</span> : null}
              </th>
              <td className="mail-cell">{person.email}</td>
              <td>
                {may.includes('person.change-role') ? (
                  <RoleChoice person={person} held={reason} onRole={onRole} />
                ) : (
                  person.role
                )}
              </td>
              <td className="since">{dayOf(person.since)}</td>
              {removes ? (
                <td className="acts-cell">
                  {person.you ? null : (
                    <button
                      type="button"
                      className="btn sm"
                      aria-label={`Remove ${person.name}…`}
                      onClick={() => onRemove(person)}
                    >
                      Remove…
                    </button>
                  )}
                </td>
              ) : null}
            </tr>
          )
        })}
      </tbody>
    </table>
  )
}

interface ChoiceProps {
  person: Member
  held: string | null
  onRole(person: Member, role: Role): void
}

function RoleChoice({ person, held, onRole }: ChoiceProps) {
  return (
    <>
      <span className={held ? 'box sel is-held' : 'box sel'}>
        <select
          aria-label={`Role of ${person.name}`}
          value={person.role}
          disabled={held !== null}
          aria-describedby={held ? `held-${person.id}` : undefined}
          onChange={(event) => {
            const chosen = roleOptions.find(({ role }) => role === event.target.value)
            if (chosen) onRole(person, chosen.role)
          }}
        >
          {roleOptions.map(({ role }) => (
            <option key={role} value={role}>
              {role}
            </option>
          ))}
        </select>
      </span>
      {held ? (
        <span className="cap" id={`held-${person.id}`}>
          {held}
        </span>
      ) : null}
    </>
  )
}
