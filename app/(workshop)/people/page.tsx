import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sheetPerson } from '@/app/sheet-person'
import { WithoutWorkshop } from '@/app/without-workshop'
import { PeopleRegister } from '@/components/people/people-register'
import { Sheet } from '@/components/shell/sheet'
import { operationsOf, presentMembership } from '@/lib/auth/access'
import { currentPerson } from '@/lib/auth/current-person'

export const metadata: Metadata = { title: 'People' }

export default async function PeoplePage() {
  const person = await currentPerson()
  if (!person) redirect('/sign-in?next=/people')
  const membership = presentMembership(person)
  if (!membership) return <WithoutWorkshop person={person} />
  const { workshopId, workshopName, role } = membership
  return (
    <Sheet current="people" className="people" person={sheetPerson(person)} signOut={signOutAction}>
      <PeopleRegister
        workshop={{ id: workshopId, name: workshopName }}
        role={role}
        may={operationsOf(role)}
      />
    </Sheet>
  )
}
