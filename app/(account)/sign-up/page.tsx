import type { Metadata } from 'next'
import { AccountSheet } from '@/components/account/account-sheet'
import { SignUpForm } from '@/components/account/forms'
import { AccountDrawing } from '../drawing'

export const metadata: Metadata = { title: 'Open a workshop' }

export default async function SignUpPage({ searchParams }: PageProps<'/sign-up'>) {
  const { next } = await searchParams
  return (
    <AccountSheet
      heading="A workshop of your own"
      words="It keeps your scenes with every version of them, and the links you send. What is on your bench now comes along."
      drawing={<AccountDrawing />}
    >
      <SignUpForm next={typeof next === 'string' ? next : undefined} />
    </AccountSheet>
  )
}
