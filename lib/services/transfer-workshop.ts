import { write } from '@/db/client'
import type { Person, Role } from '@/lib/auth/access'
import { refused } from '@/lib/errors/problem'
import { audit } from './audit'
import { holdWorkshop } from './hold-workshop'
import { memberToChange, setRole } from './membership-changes'

interface Transfer {
  /** Who becomes owner. */
  to: string
  /** What whoever hands it over is from then on. */
  role: Exclude<Role, 'owner'>
}

/** One becomes owner and the other no longer is, or neither. */
export async function transferWorkshop(
  person: Person | null,
  workshopId: string,
  { to, role }: Transfer,
): Promise<void> {
  await write(async (tx) => {
    const { person: actor } = await holdWorkshop(tx, person, 'workshop.transfer', workshopId)
    if (to === actor.id) {
      const message = 'You own the workshop already.'
      throw refused([{ path: 'to', code: 'self', message, fix: 'Choose somebody else.' }])
    }
    const heir = await memberToChange(tx, workshopId, to)
    await setRole(tx, workshopId, to, 'owner')
    await setRole(tx, workshopId, actor.id, role)
    await audit(tx, {
      actorId: actor.id,
      workshopId,
      operation: 'workshop.transfer',
      subject: `person:${to}`,
      before: { owner: actor.id, role: heir.role },
      after: { owner: to, formerly: role },
    })
  })
}
