import { eq } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { invitationById } from '@/db/queries/invitations'
import { invitations } from '@/db/schema'
import type { Role } from '@/lib/auth/access'
import { hashToken, newToken } from '@/lib/auth/tokens'
import { config } from '@/lib/config'
import type { Invitation } from '@/lib/contracts/invitations'
import { notFound } from '@/lib/errors/problem'
import { audit } from './audit'
import { invitationAnswer } from './invitation-answer'
import { postMail } from './mail/post-mail'

const days = 7

interface Inviting {
  /** One that is there already is sent again, and its old token opens nothing any more. */
  id?: string
  workshopId: string
  email: string
  role: Role
  actor: { id: string; name: string }
}

/** Row, mail and audit in the caller's transaction, with the workshop held. The token is in the mail alone. */
export async function sendInvitation(tx: Transaction, inviting: Inviting): Promise<Invitation> {
  const { workshopId, email, role, actor } = inviting
  const token = newToken()
  const sentAt = new Date()
  const endsAt = new Date(sentAt.getTime() + days * 86_400_000)
  const sending = { role, tokenHash: hashToken(token), invitedBy: actor.id, sentAt, endsAt }
  const [{ id }] = inviting.id
    ? await tx.update(invitations).set(sending).where(eq(invitations.id, inviting.id)).returning()
    : await tx
        .insert(invitations)
        .values({ workshopId, email, ...sending })
        .returning()
  const row = await invitationById(tx, id)
  if (!row) throw notFound('invitation')
  await postMail(tx, {
    template: 'invitation',
    to: { email, name: email, userId: null },
    data: {
      workshop: row.workshop,
      role,
      inviter: actor.name,
      url: `${config().origin}/invitation?token=${token}`,
      endsAt: endsAt.toISOString(),
    },
    key: `invitation:${id}:${sending.tokenHash.slice(0, 16)}`,
    workshopId,
  })
  await audit(tx, {
    actorId: actor.id,
    workshopId,
    operation: inviting.id ? 'person.invite-again' : 'person.invite',
    subject: `invitation:${id}`,
    after: { email, role, endsAt },
  })
  return invitationAnswer(row, sentAt)
}
