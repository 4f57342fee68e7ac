import type { Transaction } from '@/db/client'
import { invitationById, type InvitationRow } from '@/db/queries/invitations'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { Problem } from '@/lib/errors/problem'
import { holdWorkshop } from './hold-workshop'

/** One that is neither accepted nor withdrawn, with its workshop held, for somebody who may invite. */
export async function invitationToChange(
  tx: Transaction,
  person: Person | null,
  id: string,
): Promise<{ invitation: InvitationRow['invitation']; actor: Person }> {
  const place = (await invitationById(tx, id))?.invitation
  authorise(person, 'person.invite', place, 'invitation')
  const { person: actor } = await holdWorkshop(tx, person, 'person.invite', place?.workshopId ?? '')
  // read again, now that nobody else can answer or withdraw it
  const invitation = (await invitationById(tx, id))?.invitation
  authorise(actor, 'person.invite', invitation, 'invitation')
  if (!invitation || invitation.acceptedAt || invitation.withdrawnAt) {
    const word = invitation?.acceptedAt ? 'accepted' : 'withdrawn'
    throw new Problem('held', `This invitation is ${word} already.`, 'Look at the list again.')
  }
  return { invitation, actor }
}
