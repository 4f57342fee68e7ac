'use client'

import { deadlineOf, dayOf } from '@/components/ui/times'
import type { Invitation } from '@/lib/contracts/invitations'

interface Props {
  invitations: Invitation[]
  onSendAgain(invitation: Invitation): void
  onWithdraw(invitation: Invitation): void
}

function stateWords({ state, endsAt, acceptedAt, withdrawnAt }: Invitation): string {
  if (state === 'accepted' && acceptedAt) return `accepted ${dayOf(acceptedAt)}`
  if (state === 'withdrawn' && withdrawnAt) return `withdrawn ${dayOf(withdrawnAt)}`
  return state === 'open' ? `open until ${deadlineOf(endsAt)}` : `ended ${dayOf(endsAt)}`
}

export function InvitationTable({ invitations, onSendAgain, onWithdraw }: Props) {
  return (
    <table className="roll">
      <thead>
        <tr>
          <th scope="col">Mail address</th>
          <th scope="col">Role</th>
          <th scope="col">State</th>
          <th scope="col">Sent</th>
          <th scope="col">
            <span className="vh">Actions</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {invitations.map((invitation) => (
          <tr key={invitation.id}>
            <th scope="row" className="mail-cell">
              {invitation.email}
            </th>
            <td>{invitation.role}</td>
            <td>{stateWords(invitation)}</td>
            <td className="since">
              {dayOf(invitation.sentAt)} by {invitation.invitedBy}
            </td>
            <td className="acts-cell">
              {invitation.state === 'open' || invitation.state === 'ended' ? (
                <>
                  <button
                    type="button"
                    className="btn sm"
                    aria-label={`Send again to ${invitation.email}`}
                    onClick={() => onSendAgain(invitation)}
                  >
                    Send again
                  </button>
                  <button
                    type="button"
                    className="btn sm"
                    aria-label={`Withdraw the invitation to ${invitation.email}`}
                    onClick={() => onWithdraw(invitation)}
                  >
                    Withdraw
                  </button>
                </>
              ) : null}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
