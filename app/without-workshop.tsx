import { signOutAction } from '@/app/actions'
import { sheetPerson } from '@/app/sheet-person'
import { NoWorkshop } from '@/components/people/no-workshop'
import { Sheet } from '@/components/shell/sheet'
import type { Person } from '@/lib/auth/access'

/** What every page of a workshop is for somebody who belongs to none. */
export function WithoutWorkshop({ person }: { person: Person }) {
  return (
    <Sheet current="none" className="gone" person={sheetPerson(person)} signOut={signOutAction}>
      <NoWorkshop email={person.email} />
    </Sheet>
  )
}
