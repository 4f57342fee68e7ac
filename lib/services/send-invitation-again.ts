import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import type { Invitation } from '@/lib/contracts/invitations'
import { invitationToChange } from './invitation-to-change'
import { sendInvitation } from './send-invitation'

export async function sendInvitationAgain(person: Person | null, id: string): Promise<Invitation> {
  return write(async (tx) => {
    const { invitation, actor } = await invitationToChange(tx, person, id)
    const { workshopId, email, role } = invitation
    return sendInvitation(tx, { id, workshopId, email, role, actor })
  })
}
