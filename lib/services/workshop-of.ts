import type { Person } from '@/lib/auth/access'
import { Problem } from '@/lib/errors/problem'

/** The workshop that was named or, unnamed, the one the person has belonged to longest. */
export function workshopOf(person: Person, named: string | undefined): string {
  const workshopId = named ?? person.memberships[0]?.workshopId
  if (workshopId) return workshopId
  throw new Problem('not-allowed', 'You belong to no workshop.', 'Ask an owner of one to invite you.')
}
