import { eq, sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { invitations } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { audit } from './audit'
import { invitationToChange } from './invitation-to-change'

export async function withdrawInvitation(person: Person | null, id: string): Promise<void> {
  await write(async (tx) => {
    const { invitation, actor } = await invitationToChange(tx, person, id)
    await tx
      .update(invitations)
      .set({ withdrawnAt: sql`now()` })
      .where(eq(invitations.id, id))
    await audit(tx, {
      actorId: actor.id,
      workshopId: invitation.workshopId,
      operation: 'person.invite-withdrawn',
      subject: `invitation:${id}`,
      before: { email: invitation.email, role: invitation.role },
    })
  })
}
