'use client'

import { lazy, Suspense, useState } from 'react'
import { createPortal } from 'react-dom'
import { useMovingScene } from '@/components/drawing/moving-context'
import { deskPlaces } from '@/components/sharing/desk-places'
import { GuestDesk, type GuestDeskProps } from '@/components/sharing/guest-desk'
import { linkAddress } from '@/components/sharing/link-address'
import type { LinkKind } from '@/lib/auth/access'
import type { SceneView } from '@/scene/model/scene'

// only once somebody wants to leave a note, or to give a word
const GuestNotes = lazy(() => import('@/components/notes/guest-notes'))
const GuestVerdict = lazy(() => import('@/components/verdicts/guest-verdict'))

export interface DeskProps extends GuestDeskProps {
  kind: LinkKind
  version: number
  view: SceneView
}

/** The second step of a shared page: counting, asking and, where the link lets, notes and a word. */
export default function Desk({ kind, version, view, ...held }: DeskProps) {
  const [noting, setNoting] = useState(false)
  const [judging, setJudging] = useState(false)
  const moving = useMovingScene()
  const actions = document.getElementById(deskPlaces.actions)
  return (
    <>
      {kind !== 'look' && actions
        ? createPortal(
            <button type="button" className="btn" aria-pressed={noting} onClick={() => setNoting(!noting)}>
              Notes
            </button>,
            actions,
          )
        : null}
      {kind === 'decide' && actions
        ? createPortal(
            <button type="button" className="btn" onClick={() => setJudging(true)}>
              Give verdict…
            </button>,
            actions,
          )
        : null}
      <GuestDesk {...held} />
      {judging
        ? createPortal(
            <Suspense>
              <GuestVerdict
                address={linkAddress(held, '/verdict')}
                version={version}
                onClose={() => setJudging(false)}
              />
            </Suspense>,
            document.body,
          )
        : null}
      {noting && moving ? (
        <Suspense>
          <GuestNotes
            address={(path) => linkAddress(held, path)}
            moving={moving}
            version={version}
            view={view}
            onClose={() => setNoting(false)}
          />
        </Suspense>
      ) : null}
    </>
  )
}
