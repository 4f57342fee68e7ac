'use client'

import { useId, type FormEvent, type ReactNode } from 'react'
import { Dialog } from './dialog'
import { useRefusal } from './use-refusal'

interface Props {
  title: string
  about: { k: string; v: string }
  submit: string
  /** The button that leaves everything as it is. */
  keep: string
  send(): Promise<void>
  onClose(): void
  /** Told which field the server refused. */
  children: ReactNode | ((refusedField: string | null) => ReactNode)
}

/** A dialog that asks something and sends it: what was typed stays, and a refusal stands under it. */
export function FormDialog({ title, about, submit, keep, send, onClose, children }: Props) {
  const id = useId()
  const { run, busy, words, field } = useRefusal()
  const onSubmit = (event: FormEvent) => {
    event.preventDefault()
    void run(send)
  }
  return (
    <Dialog
      title={title}
      onClose={onClose}
      about={about}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            {keep}
          </button>
          <button type="submit" form={id} className="btn pri" disabled={busy}>
            {submit}
          </button>
        </>
      }
    >
      <form id={id} className="form-lines" onSubmit={onSubmit}>
        {typeof children === 'function' ? children(field) : children}
        <p className="msg refused" role="alert">
          {words}
        </p>
      </form>
    </Dialog>
  )
}
