import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sheetPerson } from '@/app/sheet-person'
import { AccountPages } from '@/components/account/account-pages'
import { MailPreferences } from '@/components/mail/mail-preferences'
import { Sheet } from '@/components/shell/sheet'
import { isWithin, roles } from '@/lib/auth/access'
import { currentPerson } from '@/lib/auth/current-person'

export const metadata: Metadata = { title: 'Account' }

export default async function AccountPage() {
  const person = await currentPerson()
  if (!person) redirect('/sign-in?next=/account')
  const workshops = person.memberships.map(({ workshopId, workshopName, role }) => ({
    id: workshopId,
    name: workshopName,
    role,
    mayGive: roles.filter((given) => isWithin(given, role)),
  }))
  return (
    <Sheet current="account" className="account" person={sheetPerson(person)} signOut={signOutAction}>
      <AccountPages
        person={{ name: person.name, email: person.email }}
        workshops={workshops}
        present={person.workshopId}
      >
        <MailPreferences />
      </AccountPages>
    </Sheet>
  )
}
