import type { Metadata } from 'next'
import { AccountSheet } from '@/components/account/account-sheet'
import { NewPasswordForm } from '@/components/account/forms'
import { AccountDrawing } from '../drawing'

export const metadata: Metadata = { title: 'New password', referrer: 'no-referrer', robots: { index: false } }

export default async function ResetPage({ searchParams }: PageProps<'/reset'>) {
  const { token } = await searchParams
  return (
    <AccountSheet
      heading="Choose a new password"
      words="The link that brought you here works once. Every open session of the account ends with it."
      drawing={<AccountDrawing />}
    >
      <NewPasswordForm token={typeof token === 'string' ? token : ''} />
    </AccountSheet>
  )
}
