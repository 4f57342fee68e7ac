import { z } from 'zod'
import type { WorkshopRow } from '@/db/queries/people'
import { operationsOf, roleIn, type Person } from '@/lib/auth/access'
import type { WorkshopAnswer } from '@/lib/contracts/workshops'

const storedChecklist = z.array(z.string())

export function workshopAnswer(row: WorkshopRow, person: Person): WorkshopAnswer {
  const role = roleIn(person, row.id)
  return {
    id: row.id,
    name: row.name,
    needsTwoPeople: row.needsTwoPeople,
    checklist: storedChecklist.parse(row.checklist),
    openingsKeptDays: row.openingsKeptDays,
    createdAt: row.createdAt.toISOString(),
    role: role ?? null,
    may: role ? operationsOf(role) : [],
  }
}
