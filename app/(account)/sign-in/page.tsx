import type { Metadata } from 'next'
import { AccountSheet } from '@/components/account/account-sheet'
import { SignInForm } from '@/components/account/forms'
import { AccountDrawing } from '../drawing'

export const metadata: Metadata = { title: 'Sign in' }

export default async function SignInPage({ searchParams }: PageProps<'/sign-in'>) {
  const { next } = await searchParams
  return (
    <AccountSheet
      heading="A crank train, described once, running in front of everyone who decides on it"
      words="For engine shops, designers and the people they answer to. Opening a link somebody sent you needs no account."
      drawing={<AccountDrawing />}
    >
      <SignInForm next={typeof next === 'string' ? next : undefined} />
    </AccountSheet>
  )
}
