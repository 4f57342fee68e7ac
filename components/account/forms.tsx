'use client'

import Link from 'next/link'
import { useState } from 'react'
import { goTo } from '@/components/ui/go-to'
import { call } from '@/lib/contracts/call'
import { ownPage } from '@/lib/contracts/own-page'
import type * as people from '@/lib/contracts/people'
import { AccountForm, type AccountField } from './account-form'

const mail: AccountField = { name: 'email', label: 'Mail address', type: 'email', autoComplete: 'username' }
const password: AccountField = {
  name: 'password',
  label: 'Password',
  type: 'password',
  autoComplete: 'current-password',
}
export const newPassword: AccountField = {
  ...password,
  autoComplete: 'new-password',
  hint: 'At least 10 characters. A few unrelated words make a good one.',
  minLength: 10,
}

const way = (k: string, href: string, label: string, first = false) => (
  <div className={first ? 'c3 first' : 'c3'}>
    <span className="k">{k}</span>
    <span className="v">
      <Link href={href}>{label}</Link>
    </span>
  </div>
)

const withNext = (path: string, next: string | undefined) =>
  next ? `${path}?next=${encodeURIComponent(next)}` : path

export function SignInForm({ next }: { next?: string }) {
  return (
    <AccountForm
      title="Sign in"
      fields={[mail, password]}
      submit="Sign in"
      ways={
        <>
          {way('No account needed', '/bench', 'Open the bench', true)}
          {way('New here?', withNext('/sign-up', next), 'Open a workshop')}
        </>
      }
      aside={<Link href="/forgotten-password">Forgotten password</Link>}
      send={async ({ email, password }) => {
        await call<typeof people.signIn>({
          method: 'POST',
          path: '/api/v1/auth/sign-in',
          body: { email, password },
        })
        goTo(ownPage(next, '/scenes'))
      }}
    />
  )
}

export function SignUpForm({ next }: { next?: string }) {
  return (
    <AccountForm
      title="Open a workshop"
      fields={[
        { name: 'name', label: 'Your name', type: 'text', autoComplete: 'name' },
        {
          name: 'workshopName',
          label: 'Name of the workshop',
          type: 'text',
          autoComplete: 'organization',
          optional: true,
          hint: 'May be left empty.',
        },
        mail,
        newPassword,
      ]}
      submit="Open workshop"
      ways={
        <>
          {way('Have an account?', withNext('/sign-in', next), 'Sign in', true)}
          {way('Only looking?', '/bench', 'Open the bench')}
        </>
      }
      send={async ({ name, workshopName, email, password }) => {
        await call<typeof people.signUp>({
          method: 'POST',
          path: '/api/v1/auth/sign-up',
          body: { name, email, password, ...(workshopName.trim() && { workshopName }) },
        })
        goTo(ownPage(next, '/scenes'))
      }}
    />
  )
}

export function ForgottenPasswordForm() {
  const [asked, setAsked] = useState<string | null>(null)
  if (asked)
    return (
      <div className="tb signin" role="status">
        <div className="c6 top first">
          <span className="k">Forgotten password</span>
          <h2 className="v title">A mail is on its way</h2>
        </div>
        <p className="c6 first in2 read">
          If {asked} has an account, a link to set a new password has been sent there. It can be used once,
          within an hour.
        </p>
        <div className="c6 acts first">
          <span className="cap grow" />
          <Link className="btn pri" href="/sign-in">
            Back to sign in
          </Link>
        </div>
      </div>
    )
  return (
    <AccountForm
      title="Forgotten password"
      fields={[mail]}
      submit="Send link"
      aside={<Link href="/sign-in">Back to sign in</Link>}
      send={async ({ email }) => {
        await call<typeof people.requestPasswordReset>({
          method: 'POST',
          path: '/api/v1/auth/password-resets',
          body: { email },
        })
        setAsked(email)
      }}
    />
  )
}

export function NewPasswordForm({ token }: { token: string }) {
  return (
    <AccountForm
      title="New password"
      fields={[newPassword]}
      submit="Set password"
      aside="Every open session ends."
      send={async ({ password }) => {
        await call<typeof people.resetPassword>({
          method: 'POST',
          path: '/api/v1/auth/password-resets/redeem',
          body: { token, password },
        })
        goTo('/sign-in')
      }}
    />
  )
}
