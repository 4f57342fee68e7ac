import { write } from '@/db/client'
import { countUnanswered, unansweredInvitation } from '@/db/queries/invitations'
import { memberOf } from '@/db/queries/people'
import { userByEmail } from '@/db/queries/users'
import type { Person, Role } from '@/lib/auth/access'
import type { Invitation } from '@/lib/contracts/invitations'
import { Problem } from '@/lib/errors/problem'
import { holdWorkshop } from './hold-workshop'
import { sendInvitation } from './send-invitation'

const mostOpen = 100

/** Asks whoever has this address to join. One at a time for an address: after its end it may be sent anew. */
export async function invitePerson(
  person: Person | null,
  workshopId: string,
  { email, role }: { email: string; role: Role },
): Promise<Invitation> {
  return write(async (tx) => {
    const { person: actor } = await holdWorkshop(tx, person, 'person.invite', workshopId)
    const user = await userByEmail(tx, email)
    const member = user && (await memberOf(tx, workshopId, user.id))
    if (member) {
      const detail = `${member.name} is in this workshop already, as ${member.role}.`
      throw new Problem('taken', detail, 'Change their role in the list of people.')
    }
    const before = await unansweredInvitation(tx, workshopId, email)
    if (before && before.endsAt > new Date()) {
      throw new Problem(
        'taken',
        `An invitation to ${email} is open, as ${before.role}.`,
        'Send it again, or withdraw it first.',
      )
    }
    if (!before && (await countUnanswered(tx, workshopId)) >= mostOpen) {
      throw new Problem(
        'held',
        `${mostOpen} invitations have not been answered, as many as there may be.`,
        'Withdraw some first.',
      )
    }
    return sendInvitation(tx, { id: before?.id, workshopId, email, role, actor })
  })
}
