'use client'

import { useState } from 'react'
import { FormDialog } from '@/components/ui/form-dialog'
import { TextLine } from '@/components/ui/text-line'
import type { Role } from '@/lib/auth/access'
import { call } from '@/lib/contracts/call'
import type { invitePerson } from '@/lib/contracts/invitations'
import { RoleField } from './role-field'

interface Props {
  workshop: { id: string; name: string }
  onClose(): void
  onInvited(email: string): void
}

export function InviteDialog({ workshop, onClose, onInvited }: Props) {
  const [email, setEmail] = useState('')
  const [role, setRole] = useState<Role>('reviewer')
  return (
    <FormDialog
      title="Invite somebody"
      about={{ k: 'To', v: workshop.name }}
      submit="Send invitation"
      keep="Not now"
      onClose={onClose}
      send={async () => {
        const { invitation } = await call<typeof invitePerson>({
          method: 'POST',
          path: '/api/v1/workshops/{id}/invitations',
          params: { id: workshop.id },
          body: { email, role },
        })
        onInvited(invitation.email)
      }}
    >
      {(refused) => (
        <>
          <TextLine
            label="Mail address"
            // the server says what is no address, in words of ours
            type="text"
            inputMode="email"
            autoComplete="off"
            value={email}
            onChange={setEmail}
            bad={refused === 'email'}
            required
          />
          <RoleField label="Role" value={role} onChange={setRole} />
          <p className="cap">The mail has a link that works once, within 7 days, for this address alone.</p>
        </>
      )}
    </FormDialog>
  )
}
