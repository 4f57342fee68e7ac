'use client'

import { dayOf, minuteOf } from '@/components/ui/times'
import type { ApiToken } from '@/lib/contracts/tokens'

interface Props {
  /** Null until they are known. */
  tokens: ApiToken[] | null
  onRevoke(token: ApiToken): void
}

function stateWords({ state, actsAs, role, endsAt }: ApiToken): string {
  if (state !== 'live') return state
  if (actsAs === null) return 'opens nothing: your role has changed'
  const until = `works until ${dayOf(endsAt)}`
  return actsAs === role ? until : `${until}, as ${actsAs} alone`
}

export function TokenTable({ tokens, onRevoke }: Props) {
  return (
    <section aria-labelledby="own-tokens">
      <h2 id="own-tokens">API tokens</h2>
      <p className="cap">
        A token lets a program act for you in one workshop, as one role and never beyond your own. Changing
        your password does not end it.
      </p>
      {tokens === null ? (
        <p className="cap">Setting out the list</p>
      ) : tokens.length === 0 ? (
        <p>No token yet.</p>
      ) : (
        <table className="roll">
          <thead>
            <tr>
              <th scope="col">For</th>
              <th scope="col">Workshop and role</th>
              <th scope="col">State</th>
              <th scope="col">Last used</th>
              <th scope="col">
                <span className="vh">Actions</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {tokens.map((token) => (
              <tr key={token.id}>
                <th scope="row">{token.name}</th>
                <td>
                  {token.workshop.name}, {token.role}
                </td>
                <td>{stateWords(token)}</td>
                <td className="since">
                  {token.lastUsedAt ? `used ${minuteOf(token.lastUsedAt)}` : 'never used'}
                </td>
                <td className="acts-cell">
                  {token.state === 'live' ? (
                    <button
                      type="button"
                      className="btn sm"
                      aria-label={`Revoke ${token.name}`}
                      onClick={() => onRevoke(token)}
                    >
                      Revoke
                    </button>
                  ) : null}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </section>
  )
}
