import type { Metadata } from 'next'
import { AccountSheet } from '@/components/account/account-sheet'
import { ForgottenPasswordForm } from '@/components/account/forms'
import { AccountDrawing } from '../drawing'

export const metadata: Metadata = { title: 'Forgotten password' }

export default function ForgottenPasswordPage() {
  return (
    <AccountSheet
      heading="Set a new password by mail"
      words="Say which address your account has; a link to set a new password goes there."
      drawing={<AccountDrawing />}
    >
      <ForgottenPasswordForm />
    </AccountSheet>
  )
}
