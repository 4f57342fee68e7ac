import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import { audit } from './audit'
import { holdWorkshop } from './hold-workshop'
import { endMembership, memberToChange, requireOwner } from './membership-changes'

export async function leaveWorkshop(person: Person | null, workshopId: string): Promise<void> {
  await write(async (tx) => {
    const { person: actor } = await holdWorkshop(tx, person, 'workshop.leave', workshopId)
    const { role } = await memberToChange(tx, workshopId, actor.id)
    await endMembership(tx, workshopId, actor.id)
    await requireOwner(tx, workshopId)
    await audit(tx, {
      actorId: actor.id,
      workshopId,
      operation: 'workshop.leave',
      subject: `person:${actor.id}`,
      before: { role },
    })
  })
}
