import type { Metadata } from 'next'
import { notFound, redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sheetPerson } from '@/app/sheet-person'
import { WithoutWorkshop } from '@/app/without-workshop'
import { AuditRegister } from '@/components/audit/audit-register'
import { Sheet } from '@/components/shell/sheet'
import { holds, presentMembership } from '@/lib/auth/access'
import { currentPerson } from '@/lib/auth/current-person'
import { listActors } from '@/lib/services/audit-log'

export const metadata: Metadata = { title: 'Audit log' }

export default async function AuditPage() {
  const person = await currentPerson()
  if (!person) redirect('/sign-in?next=/audit')
  const membership = presentMembership(person)
  if (!membership) return <WithoutWorkshop person={person} />
  const { workshopId, workshopName, role } = membership
  if (!holds(role, 'audit.read')) notFound()
  return (
    <Sheet current="settings" className="audit-page" person={sheetPerson(person)} signOut={signOutAction}>
      <AuditRegister
        workshop={{ id: workshopId, name: workshopName }}
        people={await listActors(person, workshopId)}
      />
    </Sheet>
  )
}
