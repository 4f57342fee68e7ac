'use client'

import { useState } from 'react'
import { FormDialog } from '@/components/ui/form-dialog'
import { goTo } from '@/components/ui/go-to'
import { TextLine } from '@/components/ui/text-line'
import { call } from '@/lib/contracts/call'
import type { createWorkshop } from '@/lib/contracts/workshops'

export function NewWorkshopDialog({ onClose }: { onClose(): void }) {
  const [name, setName] = useState('')
  return (
    <FormDialog
      title="New workshop"
      about={{ k: 'Owned by', v: 'you' }}
      submit="Open workshop"
      keep="Not now"
      onClose={onClose}
      send={async () => {
        await call<typeof createWorkshop>({ method: 'POST', path: '/api/v1/workshops', body: { name } })
        goTo('/scenes')
      }}
    >
      <TextLine label="Name of the workshop" value={name} onChange={setName} required maxLength={120} />
      <p className="cap">It has its own scenes, people and links. You go over to it at once.</p>
    </FormDialog>
  )
}
