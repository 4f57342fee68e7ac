'use client'

import { useState } from 'react'
import { StatusMark } from '@/components/ui/icon'
import { acknowledge, acknowledgementOf, withdraw, type Doubt } from '@/scene/model/doubts'
import { inTrain } from '@/scene/session/path'
import { useBench, useSessionState } from '@/scene/session/react'

/** Where the words about a row stand, for the field to point at. */
export const doubtsId = (key: string) => `doubts-${key}`

/** Unusual values under the row that holds them: asked about, mended by one press, or kept with a reason. */
export function DoubtRows({ row, doubts }: { row: string; doubts: readonly Doubt[] }) {
  if (doubts.length === 0) return null
  return (
    <tr className="word">
      <td colSpan={4} id={doubtsId(row)}>
        {doubts.map((doubt) => (
          <DoubtNote key={`${doubt.code} ${doubt.path}`} doubt={doubt} />
        ))}
      </td>
    </tr>
  )
}

function DoubtNote({ doubt }: { doubt: Doubt }) {
  const { session } = useBench()
  const known = useSessionState(({ scene }) => acknowledgementOf(scene.train, doubt))
  const [reason, setReason] = useState<string | null>(null)
  const change = (next: (train: ReturnType<typeof trainNow>) => ReturnType<typeof trainNow>) =>
    session.edit([{ path: ['train'], value: next(trainNow()) }])
  const trainNow = () => session.getState().scene.train
  const mend = doubt.mend
  const keep = () => {
    if (!reason?.trim()) return
    change((train) => acknowledge(train, doubt, reason, new Date().toISOString()))
    setReason(null)
  }
  if (known)
    return (
      <p className="doubt kept">
        <span className="st ok">
          <StatusMark kind="ok" /> kept
        </span>{' '}
        {doubt.head} Reason: {known.reason}
        {known.at ? ` (${known.at.slice(0, 10)})` : ''}{' '}
        <button
          type="button"
          className="btn sm txt"
          onClick={() => change((train) => withdraw(train, doubt))}
        >
          Ask again
        </button>
      </p>
    )
  return (
    <div className="doubt">
      <p>
        <span className="st mon">
          <StatusMark kind="monitor" /> unusual
        </span>{' '}
        <b>{doubt.head}</b> {doubt.message}
      </p>
      {reason === null ? (
        <div className="row">
          {mend ? (
            <button type="button" className="btn sm" onClick={() => session.edit(inTrain(mend.changes))}>
              {mend.label}
            </button>
          ) : null}
          <button type="button" className="btn sm txt" onClick={() => setReason('')}>
            Keep it…
          </button>
        </div>
      ) : (
        <form
          className="row"
          onSubmit={(event) => {
            event.preventDefault()
            keep()
          }}
        >
          <input
            className="reason"
            aria-label={`Why ${doubt.head.replace(/\.$/, '')} is kept`}
            placeholder="because…"
            maxLength={300}
            autoFocus
            value={reason}
            onChange={(event) => setReason(event.target.value)}
            onKeyDown={(event) => {
              if (event.key === 'Escape') setReason(null)
            }}
          />
          <button type="submit" className="btn sm" disabled={!reason.trim()}>
            Keep with this reason
          </button>
        </form>
      )}
    </div>
  )
}
