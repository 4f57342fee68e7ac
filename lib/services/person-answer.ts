import { operationsOf, type Person } from '@/lib/auth/access'
import type { PersonAnswer } from '@/lib/contracts/people'

export const personAnswer = (person: Person): PersonAnswer => ({
  id: person.id,
  name: person.name,
  email: person.email,
  workshop: person.workshopId,
  workshops: person.memberships.map(({ workshopId, workshopName, role }) => ({
    id: workshopId,
    name: workshopName,
    role,
    may: operationsOf(role),
  })),
})
