import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import { audit } from './audit'
import { holdWorkshop } from './hold-workshop'
import { endMembership, memberToChange, requireOwner } from './membership-changes'

/** What they made stays; they themselves are out from the next request on. */
export async function removePerson(person: Person | null, workshopId: string, userId: string): Promise<void> {
  await write(async (tx) => {
    const { person: actor } = await holdWorkshop(tx, person, 'person.remove', workshopId)
    const { role } = await memberToChange(tx, workshopId, userId)
    await endMembership(tx, workshopId, userId)
    await requireOwner(tx, workshopId)
    await audit(tx, {
      actorId: actor.id,
      workshopId,
      operation: 'person.remove',
      subject: `person:${userId}`,
      before: { role },
    })
  })
}
