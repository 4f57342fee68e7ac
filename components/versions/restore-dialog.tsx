'use client'

import { useId, useState, type FormEvent } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { call, Refusal } from '@/lib/contracts/call'
import type { restoreVersion } from '@/lib/contracts/versions'

interface Props {
  sceneId: string
  title: string
  number: number
  /** The latest version, which the restored one comes on top of. */
  head: number
  onClose(): void
  onRestored(version: number): void
  /** The latest is another one by now. */
  onOvertaken(): void
}

export function RestoreDialog({ sceneId, title, number, head, onClose, onRestored, onOvertaken }: Props) {
  const id = useId()
  const [message, setMessage] = useState('')
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const [key] = useState(() => crypto.randomUUID())
  async function submit(event: FormEvent) {
    event.preventDefault()
    setBusy(true)
    try {
      const { version } = await call<typeof restoreVersion>({
        method: 'POST',
        path: '/api/v1/scenes/{id}/versions/{number}/restore',
        params: { id: sceneId, number },
        body: { base: head, message },
        // another head is another request
        key: `${key}-${head}`,
      })
      onRestored(version.number)
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      setRefusal(error)
      if (error.status === 409) onOvertaken()
    } finally {
      setBusy(false)
    }
  }
  return (
    <Dialog
      title={`Restore version ${number}`}
      about={{ k: 'Scene', v: title }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Not now
          </button>
          <button type="submit" form={`${id}-form`} className="btn pri" disabled={busy}>
            {busy ? 'Saving' : `Save version ${head + 1}`}
          </button>
        </>
      }
    >
      <p>
        Version {head + 1} will be as version {number} was. Version {head} and all others stay as they are,
        and so does your draft.
      </p>
      <form id={`${id}-form`} className="lf" onSubmit={submit}>
        <label htmlFor={id}>Why, for whoever reads the list of versions</label>
        <div className="box">
          <input
            id={id}
            value={message}
            maxLength={440}
            onChange={(event) => setMessage(event.target.value)}
          />
        </div>
        <p className="msg refused" role="alert">
          {refusal
            ? refusal.status === 409
              ? `${refusal.problem.detail} It is in the list now: save once more to restore on top of it.`
              : `${refusal.problem.detail} ${refusal.problem.cure}`
            : ''}
        </p>
      </form>
    </Dialog>
  )
}
