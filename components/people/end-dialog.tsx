'use client'

import { FormDialog } from '@/components/ui/form-dialog'
import { call } from '@/lib/contracts/call'
import type { leaveWorkshop, Member, removePerson } from '@/lib/contracts/workshops'

interface Props {
  workshop: { id: string; name: string }
  /** Without somebody it is oneself who leaves. */
  person: Member | null
  onClose(): void
  onEnded(): void
}

/** Asks once more before somebody is out of a workshop. */
export function EndDialog({ workshop, person, onClose, onEnded }: Props) {
  return (
    <FormDialog
      title={person ? `Remove ${person.name}` : 'Leave the workshop'}
      about={{ k: 'Workshop', v: workshop.name }}
      submit={person ? 'Remove' : 'Leave'}
      keep={person ? 'Keep them' : 'Stay'}
      onClose={onClose}
      send={async () => {
        const { id } = workshop
        if (person) {
          await call<typeof removePerson>({
            method: 'DELETE',
            path: '/api/v1/workshops/{id}/people/{person}',
            params: { id, person: person.id },
          })
        } else {
          await call<typeof leaveWorkshop>({
            method: 'DELETE',
            path: '/api/v1/workshops/{id}/membership',
            params: { id },
          })
        }
        onEnded()
      }}
    >
      <p className="read">
        {person
          ? `${person.email} sees nothing of it from the next page on, and their API tokens for it end.`
          : 'You see nothing of it from the next page on, and your API tokens for it end.'}{' '}
        What was made here stays, with its author’s name. Coming back takes a new invitation.
      </p>
    </FormDialog>
  )
}
