import { eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { workshops } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import type { WorkshopAnswer } from '@/lib/contracts/workshops'
import { audit } from './audit'
import { holdWorkshop } from './hold-workshop'
import { workshopAnswer } from './workshop-answer'

export interface WorkshopChange {
  name?: string
  needsTwoPeople?: boolean
  checklist?: string[]
  openingsKeptDays?: number
}

/** Only what is named changes, and only that is written down. */
export async function changeWorkshop(
  person: Person | null,
  id: string,
  change: WorkshopChange,
): Promise<WorkshopAnswer> {
  return write(async (tx) => {
    const { workshop, person: actor } = await holdWorkshop(tx, person, 'workshop.change', id)
    const changed = (Object.keys(change) as (keyof WorkshopChange)[]).filter(
      (name) => change[name] !== undefined && JSON.stringify(change[name]) !== JSON.stringify(workshop[name]),
    )
    if (changed.length === 0) return workshopAnswer(workshop, actor)
    const pick = (from: WorkshopChange | typeof workshop) =>
      Object.fromEntries(changed.map((name) => [name, from[name]]))
    const [row] = await tx.update(workshops).set(pick(change)).where(eq(workshops.id, id)).returning()
    await audit(tx, {
      actorId: actor.id,
      workshopId: id,
      operation: 'workshop.change',
      subject: `workshop:${id}`,
      before: pick(workshop),
      after: pick(change),
    })
    return workshopAnswer(row, actor)
  })
}
