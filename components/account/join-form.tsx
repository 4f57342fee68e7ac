'use client'

import Link from 'next/link'
import { call } from '@/lib/contracts/call'
import type { acceptInvitation, InvitationLook } from '@/lib/contracts/invitations'
import { goTo } from '@/components/ui/go-to'
import { deadlineOf } from '@/components/ui/times'
import { AccountForm } from './account-form'
import { newPassword } from './forms'
import { Local } from './local'

interface Props {
  token: string
  invitation: InvitationLook
  signedInAs: string | null
  signOut(form: FormData): void | Promise<void>
}

/** The ways into a workshop that an invitation opens: with the account that has the address, or with a new one. */
export function JoinForm({ token, invitation, signedInAs, signOut }: Props) {
  const { workshop, email, hasAccount } = invitation
  const here = `/invitation?token=${encodeURIComponent(token)}`
  const until = (
    <>
      Works once, until <Local write={() => deadlineOf(invitation.endsAt)} />.
    </>
  )
  const accept = async (account?: { name: string; password: string }) => {
    await call<typeof acceptInvitation>({
      method: 'POST',
      path: '/api/v1/invited/{token}',
      params: { token },
      body: account ? { account } : {},
    })
    goTo('/scenes')
  }

  if (signedInAs === email)
    return (
      <AccountForm
        title="Invitation"
        words={
          <p className="read">
            You are signed in as {email}. {workshop} is added to your workshops.
          </p>
        }
        fields={[]}
        submit="Join workshop"
        aside={until}
        send={() => accept()}
      />
    )
  if (signedInAs)
    return (
      <form className="tb signin" aria-label="Invitation" action={signOut}>
        <input type="hidden" name="next" value={here} />
        <div className="c6 top first">
          <span className="k">Invitation</span>
          <h2 className="v title">For another address</h2>
        </div>
        <p className="c6 first in2 read">
          This invitation is for {email}; you are signed in as {signedInAs}. Sign out, and it is here again.
        </p>
        <div className="c6 acts first">
          <span className="cap grow">{until}</span>
          <button className="btn pri" type="submit">
            Sign out
          </button>
        </div>
      </form>
    )
  if (hasAccount)
    return (
      <div className="tb signin" role="group" aria-label="Invitation">
        <div className="c6 top first">
          <span className="k">Invitation</span>
          <h2 className="v title">Sign in to join</h2>
        </div>
        <p className="c6 first in2 read">{email} has an account. Sign in with it, and join.</p>
        <div className="c6 acts first">
          <span className="cap grow">{until}</span>
          <Link className="btn pri" href={`/sign-in?next=${encodeURIComponent(here)}`}>
            Sign in
          </Link>
        </div>
      </div>
    )
  return (
    <AccountForm
      title="Invitation"
      words={<p className="cap">A new account for {email}; no other mail is needed.</p>}
      fields={[{ name: 'name', label: 'Your name', type: 'text', autoComplete: 'name' }, newPassword]}
      submit="Join workshop"
      aside={until}
      send={({ name, password }) => accept({ name, password })}
    />
  )
}
