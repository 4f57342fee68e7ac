'use client'

import { useId, useState } from 'react'
import { Dialog } from '@/components/ui/dialog'
import type { Note, Settlement } from '@/lib/contracts/notes'
import { Refused } from './refused'
import type { NoteDesk } from './use-note-desk'
import { useSending } from './use-sending'
import { titleOf } from './note-words'

type Reason = Settlement['reason']

/** Why a note is settled: one of four reasons, and words if they help. */
export function SettleDialog({ desk, note, onClose }: { desk: NoteDesk; note: Note; onClose(): void }) {
  const { actions, headVersion } = desk
  const id = useId()
  const later = headVersion > note.version
  const [reason, setReason] = useState<Reason>(
    note.kind === 'question' ? 'answered' : later ? 'fixed' : 'will-not-change',
  )
  const [fixedIn, setFixedIn] = useState(headVersion)
  const [other, setOther] = useState('')
  const [words, setWords] = useState('')
  const { busy, refused, refuse, send } = useSending()
  const versions = Array.from({ length: Math.max(0, headVersion - note.version) }, (_, i) => headVersion - i)

  const settlement = (): Settlement | null => {
    if (reason === 'fixed') return { reason, version: fixedIn }
    if (reason !== 'duplicate') return { reason }
    const number = Number(other)
    return /^\s*\d+\s*$/.test(other) && number > 0 ? { reason, number } : null
  }
  const settle = () => {
    const chosen = settlement()
    if (!chosen) return refuse('Give the number of the note that says the same: a whole number, such as 2.')
    void send(() => actions.settle(note.number, { settlement: chosen, words }), onClose)
  }
  const choice = (value: Reason, label: string, held?: string) => (
    <label className={held ? 'vo held' : reason === value ? 'vo on' : 'vo'}>
      <input
        type="radio"
        name={`${id}-reason`}
        checked={reason === value}
        disabled={held !== undefined}
        onChange={() => setReason(value)}
      />
      <span>
        <b>{label}</b>
        {held ? <small>{held}</small> : null}
      </span>
    </label>
  )
  return (
    <Dialog
      title={`Settle note ${note.number}`}
      about={{ k: 'Note', v: titleOf(note) }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Leave it open
          </button>
          <button type="button" className="btn pri" disabled={busy} onClick={settle}>
            Settle
          </button>
        </>
      }
    >
      <fieldset className="reasons">
        <legend>Reason</legend>
        {choice(
          'fixed',
          'Fixed in a version',
          later ? undefined : `held: no version after ${note.version} yet`,
        )}
        {choice('will-not-change', 'Will not change')}
        {choice('duplicate', 'The same as another note')}
        {choice('answered', 'Question answered')}
      </fieldset>
      {reason === 'fixed' ? (
        <div className="lf">
          <label htmlFor={`${id}-version`}>Fixed in version</label>
          <div className="box">
            <select
              id={`${id}-version`}
              value={fixedIn}
              onChange={(event) => setFixedIn(Number(event.target.value))}
            >
              {versions.map((version) => (
                <option key={version}>{version}</option>
              ))}
            </select>
          </div>
        </div>
      ) : null}
      {reason === 'duplicate' ? (
        <div className="lf">
          <label htmlFor={`${id}-other`}>Number of the other note</label>
          <div className={refused ? 'box bad' : 'box'}>
            <input
              id={`${id}-other`}
              inputMode="numeric"
              value={other}
              aria-describedby={refused ? `${id}-refused` : undefined}
              onChange={(event) => setOther(event.target.value)}
            />
          </div>
        </div>
      ) : null}
      <div className="lf">
        <label htmlFor={`${id}-words`}>In words, if they help</label>
        <div className="box">
          <textarea
            id={`${id}-words`}
            rows={2}
            maxLength={500}
            value={words}
            onChange={(event) => setWords(event.target.value)}
          />
        </div>
      </div>
      <Refused id={`${id}-refused`} text={refused} />
    </Dialog>
  )
}
