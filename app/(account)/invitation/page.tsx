import { notFound } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { AccountSheet } from '@/components/account/account-sheet'
import { JoinForm } from '@/components/account/join-form'
import { currentPerson } from '@/lib/auth/current-person'
import { Problem } from '@/lib/errors/problem'
import { lookAtInvitation } from '@/lib/services/look-at-invitation'
import { AccountDrawing } from '../drawing'
import { invitationMetadata } from './metadata'

export const metadata = invitationMetadata

/** Only shows: what an invitation does is done by sending the form. */
export default async function InvitationPage({ searchParams }: PageProps<'/invitation'>) {
  const { token } = await searchParams
  const key = typeof token === 'string' ? token : ''
  const invitation = await invitationBehind(key)
  const person = await currentPerson()
  return (
    <AccountSheet
      heading={`Come into ${invitation.workshop}`}
      words={`${invitation.inviter} invites ${invitation.email} as ${invitation.role}.`}
      drawing={<AccountDrawing />}
    >
      <JoinForm
        token={key}
        invitation={invitation}
        signedInAs={person?.email ?? null}
        signOut={signOutAction}
      />
    </AccountSheet>
  )
}

async function invitationBehind(token: string) {
  try {
    return await lookAtInvitation(token)
  } catch (error) {
    if (error instanceof Problem && error.kind === 'not-found') notFound()
    throw error
  }
}
