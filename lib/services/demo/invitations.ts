import { eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { invitations } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { invitePerson } from '../invite-person'
import { listInvitations } from '../list-invitations'
import { withdrawInvitation } from '../withdraw-invitation'

const day = 86_400_000

/** One that is open, one past its end and one withdrawn. */
export async function demoInvitations(tamsin: Person): Promise<void> {
  const { workshopId } = tamsin
  if (!workshopId) return
  if ((await listInvitations(tamsin, workshopId, { limit: 1 })).invitations.length > 0) return
  const wrong = await invitePerson(tamsin, workshopId, { email: 'bram@quayside.example', role: 'service' })
  await withdrawInvitation(tamsin, wrong.id)
  const ended = await invitePerson(tamsin, workshopId, { email: 'pip@thornquay.example', role: 'reviewer' })
  await write((tx) =>
    tx
      .update(invitations)
      .set({ sentAt: new Date(Date.now() - 8 * day), endsAt: new Date(Date.now() - day) })
      .where(eq(invitations.id, ended.id)),
  )
  await invitePerson(tamsin, workshopId, { email: 'bram@thornquay.example', role: 'service' })
}
