'use client'

import { useId, useState } from 'react'
import { FormDialog } from '@/components/ui/form-dialog'
import type { Role } from '@/lib/auth/access'
import { call } from '@/lib/contracts/call'
import type { Member, transferWorkshop } from '@/lib/contracts/workshops'
import { RoleField } from './role-field'

interface Props {
  workshop: { id: string; name: string }
  others: Member[]
  onClose(): void
}

export function TransferDialog({ workshop, others, onClose }: Props) {
  const id = useId()
  const [to, setTo] = useState(others[0]?.id ?? '')
  const [role, setRole] = useState<Exclude<Role, 'owner'>>('designer')
  return (
    <FormDialog
      title="Hand the workshop over"
      about={{ k: 'Workshop', v: workshop.name }}
      submit="Hand over"
      keep="Keep it"
      onClose={onClose}
      send={async () => {
        await call<typeof transferWorkshop>({
          method: 'POST',
          path: '/api/v1/workshops/{id}/transfers',
          params: { id: workshop.id },
          body: { to, role },
        })
        window.location.reload()
      }}
    >
      <div className="lf">
        <label htmlFor={id}>New owner</label>
        <div className="box">
          <select id={id} value={to} onChange={(event) => setTo(event.target.value)}>
            {others.map((person) => (
              <option key={person.id} value={person.id}>
                {person.name}, {person.role}
              </option>
            ))}
          </select>
        </div>
      </div>
      <RoleField
        label="You are from then on"
        value={role}
        without={['owner']}
        onChange={(chosen) => {
          if (chosen !== 'owner') setRole(chosen)
        }}
      />
      <p className="cap">Both happen together. Only the new owner can hand it back.</p>
    </FormDialog>
  )
}
