import type { Person } from '@/lib/auth/access'
import { Problem } from '@/lib/errors/problem'

/** The workshop that was named or, unnamed, the one before the person. */
export function workshopOf(person: Person, named: string | undefined): string {
  const workshopId = named ?? person.workshopId
  if (workshopId) return workshopId
  throw new Problem(
    'not-allowed',
    'You belong to no workshop.',
    'Make one, or ask an owner of one to invite you.',
  )
}
