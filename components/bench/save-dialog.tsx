'use client'

import Link from 'next/link'
import { useId, useState } from 'react'
import { Dialog } from '@/components/ui/dialog'

export function SignInDialog({ to, onClose }: { to: 'save' | 'share'; onClose(): void }) {
  return (
    <Dialog
      title={to === 'save' ? 'Sign in to save' : 'Sign in to share'}
      about={{ k: 'Draft', v: 'kept in this browser' }}
      onClose={onClose}
      actions={
        <>
          <Link className="btn" href="/sign-up?next=/bench">
            Open a workshop
          </Link>
          <Link className="btn pri" href="/sign-in?next=/bench">
            Sign in
          </Link>
        </>
      }
    >
      <p>
        {to === 'save'
          ? 'Versions belong to a workshop. '
          : 'A link opens a saved version, and versions belong to a workshop. '}
        Your draft is kept here and waits for you when you come back.
      </p>
    </Dialog>
  )
}

interface SaveProps {
  version: number
  title: string
  busy: boolean
  problem: string | null
  onClose(): void
  onSave(message: string): void
}

export function SaveDialog({ version, title, busy, problem, onClose, onSave }: SaveProps) {
  const id = useId()
  const [message, setMessage] = useState('')
  return (
    <Dialog
      title={`Save version ${version}`}
      about={{ k: 'Scene', v: title }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Not yet
          </button>
          <button type="button" className="btn pri" disabled={busy} onClick={() => onSave(message)}>
            {busy ? 'Saving' : `Save version ${version}`}
          </button>
        </>
      }
    >
      <form
        className="lf"
        onSubmit={(event) => {
          event.preventDefault()
          onSave(message)
        }}
      >
        <label htmlFor={id}>What changed, for whoever reads the list of versions</label>
        <div className="box">
          <input
            id={id}
            value={message}
            maxLength={500}
            onChange={(event) => setMessage(event.target.value)}
          />
        </div>
        {problem ? (
          <p className="msg" role="alert">
            {problem}
          </p>
        ) : null}
      </form>
      <p className="cap">
        A version is never changed afterwards. It opens at this crank angle, view, speed and overlays.
      </p>
    </Dialog>
  )
}
