import type { Metadata } from 'next'
import Link from 'next/link'
import { redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sheetPerson } from '@/app/sheet-person'
import { WithoutWorkshop } from '@/app/without-workshop'
import { OutboxSection } from '@/components/mail/outbox-section'
import { WorkshopSettings } from '@/components/people/workshop-settings'
import { Sheet } from '@/components/shell/sheet'
import { currentPerson } from '@/lib/auth/current-person'
import { readWorkshop } from '@/lib/services/read-workshop'

export const metadata: Metadata = { title: 'Settings' }

export default async function SettingsPage() {
  const person = await currentPerson()
  if (!person) redirect('/sign-in?next=/settings')
  if (!person.workshopId) return <WithoutWorkshop person={person} />
  const workshop = await readWorkshop(person, person.workshopId)
  return (
    <Sheet current="settings" className="settings" person={sheetPerson(person)} signOut={signOutAction}>
      <WorkshopSettings key={workshop.id} workshop={workshop}>
        <OutboxSection workshopId={workshop.id} may={workshop.may} />
        {workshop.may.includes('audit.read') ? (
          <section>
            <h2>Record</h2>
            <Link href="/audit">Audit log: who did what, and when</Link>
          </section>
        ) : null}
      </WorkshopSettings>
    </Sheet>
  )
}
