'use client'

import dynamic from 'next/dynamic'
import { useState, type ReactNode } from 'react'
import { createPortal } from 'react-dom'
import type { FigureId } from '@/lib/mechanics/explain/explain'
import type { AskedBehind } from './behind-dialog'

/** Which figure is meant: its name, and the part, moment or order where it has one; sizes where the document's are not meant. */
export type Behind = FigureId | AskedBehind

const BehindDialog = dynamic(() => import('./behind-dialog').then((module) => module.BehindDialog), {
  ssr: false,
})

interface Props {
  behind: Behind
  /** The figure and its name, for whoever does not see where it stands: "Swept volume, 1,998 cm³". A table's heads say it already. */
  label?: string
  children: ReactNode
}

/** A figure as it stands on the sheet; pressing it opens what is behind it. */
export function BehindFigure({ behind, label, children }: Props) {
  const [open, setOpen] = useState(false)
  const asked = typeof behind === 'string' ? { figure: behind } : behind
  return (
    <>
      <button
        type="button"
        className="behind"
        aria-haspopup="dialog"
        aria-label={label && `${label}, behind this figure`}
        title="Behind this figure"
        onClick={() => setOpen(true)}
      >
        {children}
      </button>
      {open
        ? createPortal(<BehindDialog asked={asked} onClose={() => setOpen(false)} />, document.body)
        : null}
    </>
  )
}
