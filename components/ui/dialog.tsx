'use client'

import { useId, useLayoutEffect, useRef, type ReactNode } from 'react'

interface Props {
  title: string
  onClose(): void
  /** The dialog's own title block: what it is about, and its actions with the primary one last. */
  about: { k: string; v: string }
  actions: ReactNode
  wide?: boolean
  children: ReactNode
}

/** A slip of paper over the sheet, by the browser's own dialog: focus stays inside, Escape closes. */
export function Dialog({ title, onClose, about, actions, wide, children }: Props) {
  const id = useId()
  const dialog = useRef<HTMLDialogElement>(null)
  // closed while it is still in the page, so that the browser gives the focus back
  useLayoutEffect(() => {
    const element = dialog.current
    element?.showModal()
    return () => element?.close()
  }, [])
  return (
    <dialog
      ref={dialog}
      className={wide ? 'dlg wide-dlg' : 'dlg'}
      aria-labelledby={id}
      onCancel={(event) => {
        event.preventDefault()
        onClose()
      }}
    >
      <div className="in">
        <h2 id={id}>{title}</h2>
        {children}
      </div>
      <div className="tb">
        <span className="first top about">
          <span className="k">{about.k}</span>
          <span className="v">{about.v}</span>
        </span>
        <span className="acts top">{actions}</span>
      </div>
    </dialog>
  )
}
