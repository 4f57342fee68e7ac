'use client'

import { minuteOf } from '@/components/ui/times'
import type { SessionAnswer } from '@/lib/contracts/account'

interface Props {
  /** Null until they are known. */
  sessions: SessionAnswer[] | null
  onEnd(session: SessionAnswer): void
  onEndOthers(): void
}

export function SessionTable({ sessions, onEnd, onEndOthers }: Props) {
  return (
    <section aria-labelledby="own-sessions">
      <h2 id="own-sessions">Where you are signed in</h2>
      {sessions === null ? (
        <p className="cap">Setting out the list</p>
      ) : (
        <>
          <table className="roll">
            <thead>
              <tr>
                <th scope="col">Device</th>
                <th scope="col">Begun</th>
                <th scope="col">Last seen</th>
                <th scope="col">
                  <span className="vh">Actions</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {sessions.map((session) => (
                <tr key={session.id}>
                  <th scope="row">{session.device}</th>
                  <td className="since">begun {minuteOf(session.begunAt)}</td>
                  <td>{session.present ? 'this one, now' : `seen ${minuteOf(session.lastSeenAt)}`}</td>
                  <td className="acts-cell">
                    {session.present ? null : (
                      <button
                        type="button"
                        className="btn sm"
                        aria-label={`Sign out ${session.device}, seen ${minuteOf(session.lastSeenAt)}`}
                        onClick={() => onEnd(session)}
                      >
                        Sign out
                      </button>
                    )}
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
          <button type="button" className="btn" disabled={sessions.length < 2} onClick={onEndOthers}>
            Sign out everywhere else
          </button>
        </>
      )}
    </section>
  )
}
