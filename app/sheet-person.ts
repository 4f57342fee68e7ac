import type { SheetPerson } from '@/components/shell/sheet'
import { presentMembership, type Person } from '@/lib/auth/access'
import { goOverAction } from './actions'

/** Who stands in the edge of a sheet, and the workshop that it belongs to: by default the one before them. */
export function sheetPerson(person: Person, workshopId = person.workshopId): SheetPerson {
  const { memberships, name } = person
  const shown = memberships.find((membership) => membership.workshopId === workshopId)
  return {
    name,
    workshop: (shown ?? presentMembership(person))?.workshopName ?? null,
    others: memberships
      .filter((membership) => membership.workshopId !== person.workshopId)
      .map((membership) => ({ id: membership.workshopId, name: membership.workshopName })),
    goOver: goOverAction,
  }
}
