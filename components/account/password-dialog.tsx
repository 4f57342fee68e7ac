'use client'

import { useState } from 'react'
import { FormDialog } from '@/components/ui/form-dialog'
import { TextLine } from '@/components/ui/text-line'
import type { changePassword } from '@/lib/contracts/account'
import { call } from '@/lib/contracts/call'
import { newPassword } from './forms'

interface Props {
  email: string
  onClose(): void
  /** How many other sessions ended with it. */
  onChanged(ended: number): void
}

export function PasswordDialog({ email, onClose, onChanged }: Props) {
  const [present, setPresent] = useState('')
  const [password, setPassword] = useState('')
  return (
    <FormDialog
      title="Change your password"
      about={{ k: 'Account', v: email }}
      submit="Change password"
      keep="Keep it"
      onClose={onClose}
      send={async () => {
        const { ended } = await call<typeof changePassword>({
          method: 'PUT',
          path: '/api/v1/account/password',
          body: { present, password },
        })
        onChanged(ended)
      }}
    >
      {(refused) => (
        <>
          <input
            type="text"
            className="vh"
            autoComplete="username"
            value={email}
            readOnly
            tabIndex={-1}
            aria-hidden
          />
          <TextLine
            label="Present password"
            type="password"
            autoComplete="current-password"
            value={present}
            onChange={setPresent}
            bad={refused === 'present'}
            required
          />
          <TextLine
            label="New password"
            type="password"
            autoComplete="new-password"
            minLength={newPassword.minLength}
            hint={newPassword.hint}
            value={password}
            onChange={setPassword}
            bad={refused === 'password'}
            required
          />
          <p className="cap">You stay signed in here and are signed out everywhere else.</p>
        </>
      )}
    </FormDialog>
  )
}
