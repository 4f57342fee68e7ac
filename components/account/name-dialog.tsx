'use client'

import { useState } from 'react'
import { FormDialog } from '@/components/ui/form-dialog'
import { TextLine } from '@/components/ui/text-line'
import type { renamePerson } from '@/lib/contracts/account'
import { call } from '@/lib/contracts/call'

interface Props {
  name: string
  onClose(): void
  onRenamed(name: string): void
}

export function NameDialog({ name, onClose, onRenamed }: Props) {
  const [typed, setTyped] = useState(name)
  return (
    <FormDialog
      title="Change your name"
      about={{ k: 'Now', v: name }}
      submit="Change name"
      keep="Keep it"
      onClose={onClose}
      send={async () => {
        await call<typeof renamePerson>({ method: 'PATCH', path: '/api/v1/account', body: { name: typed } })
        onRenamed(typed.trim())
      }}
    >
      <TextLine
        label="Your name"
        value={typed}
        onChange={setTyped}
        autoComplete="name"
        maxLength={80}
        required
        hint="It stands beside what you made, also what you made before."
      />
    </FormDialog>
  )
}
