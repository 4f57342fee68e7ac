'use client'

import { lazy, Suspense, useState } from 'react'
import { createPortal } from 'react-dom'
import { useMovingScene } from '@/components/drawing/moving-context'
import { CountLooking } from './count-looking'
import { deskPlaces } from './desk-places'
import type { LinkHeld } from './link-address'
import { PrintButton } from './print-button'

// only once somebody wants to ask
const AskDialog = lazy(() => import('./ask-dialog').then((it) => ({ default: it.AskDialog })))

export interface GuestDeskProps extends LinkHeld {
  endsAt: string | null
}

const here = new Intl.DateTimeFormat('en-GB', {
  ...{ day: 'numeric', month: 'long', year: 'numeric', hour: '2-digit', minute: '2-digit' },
  timeZoneName: 'long',
})

/** By the clock of whoever reads, with the name of their zone; nothing where that is the one the server writes. */
function hereInWords(iso: string): string | null {
  const date = new Date(iso)
  return date.getTimezoneOffset() === 0 ? null : here.format(date)
}

/** What a guest has beside the drawing: the end of the link by their own clock, printing, and asking whoever sent it. */
export function GuestDesk({ endsAt, ...held }: GuestDeskProps) {
  const [asking, setAsking] = useState(false)
  const moving = useMovingScene()
  const actions = document.getElementById(deskPlaces.actions)
  const ends = document.getElementById(deskPlaces.ends)
  const end = endsAt && hereInWords(endsAt)
  return (
    <>
      <CountLooking {...held} />
      {ends && end ? createPortal(<>Where you are: {end}</>, ends) : null}
      {actions
        ? createPortal(
            <>
              <PrintButton />
              <button type="button" className="btn pri" onClick={() => setAsking(true)}>
                Ask a question…
              </button>
            </>,
            actions,
          )
        : null}
      {asking
        ? createPortal(
            <Suspense>
              <AskDialog {...held} moving={moving} onClose={() => setAsking(false)} />
            </Suspense>,
            document.body,
          )
        : null}
    </>
  )
}
