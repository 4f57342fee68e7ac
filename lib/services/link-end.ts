import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { refused } from '@/lib/errors/problem'

const usualDays = 30

/** When a link ends: as asked for, after 30 days where nothing is said, and never only where an owner wants it so. */
export function linkEnd(
  person: Person | null,
  scene: { workshopId: string } | undefined,
  asked: string | null | undefined,
  now: Date,
): Date | null {
  if (asked === undefined) return new Date(now.getTime() + usualDays * 86_400_000)
  if (asked === null) {
    authorise(person, 'link.endless', scene)
    return null
  }
  const ends = new Date(asked)
  if (ends > now) return ends
  const message = 'This time has passed already.'
  throw refused([{ path: 'endsAt', code: 'past', message, fix: 'Give a later one.' }])
}
