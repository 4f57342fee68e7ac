import { write } from '@/db/client'
import type { Person, Role } from '@/lib/auth/access'
import { audit } from './audit'
import { holdWorkshop } from './hold-workshop'
import { memberToChange, requireOwner, setRole } from './membership-changes'

export async function changeRole(
  person: Person | null,
  workshopId: string,
  userId: string,
  role: Role,
): Promise<void> {
  await write(async (tx) => {
    const { person: actor } = await holdWorkshop(tx, person, 'person.change-role', workshopId)
    const member = await memberToChange(tx, workshopId, userId)
    if (member.role === role) return
    await setRole(tx, workshopId, userId, role)
    await requireOwner(tx, workshopId)
    await audit(tx, {
      actorId: actor.id,
      workshopId,
      operation: 'person.change-role',
      subject: `person:${userId}`,
      before: { role: member.role },
      after: { role },
    })
  })
}
