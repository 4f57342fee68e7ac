'use client'

import Link from 'next/link'
import { useState } from 'react'
import { Dialog } from '@/components/ui/dialog'
import type { Operation } from '@/lib/auth/access'
import { frameHtml } from '@/lib/contracts/frame-html'
import { CopyLine } from './copy-line'
import { bodyOf, newDraft } from './link-draft'
import { LinkFields } from './link-fields'
import { LinkTable } from './link-table'
import { useAttempt } from './use-attempt'
import { useLinks } from './use-links'

export interface ShareDialogProps {
  sceneId: string
  version: number
  title: string
  /** Something on the page is not in the saved version. */
  changed: boolean
  may: readonly Operation[]
  onClose(): void
}

const frame = { width: 960, height: 640 }

/** Links to a scene: make one, see at a glance who has which, withdraw. */
export function ShareDialog({ sceneId, version, title, changed, may, onClose }: ShareDialogProps) {
  const [draft, setDraft] = useState(newDraft)
  const [made, setMade] = useState<{ url: string; framed: boolean } | null>(null)
  const { attempt, busy, issues, words } = useAttempt()
  const { links, make, withdraw } = useLinks(sceneId)
  const onMake = () =>
    attempt(async () => {
      const { url, link } = await make(bodyOf(draft, version, Date.now()))
      setMade({ url, framed: link.frameOrigins.length > 0 })
    })
  return (
    <Dialog
      title="Share by a link"
      wide
      about={{ k: 'Scene', v: `${title}, version ${version}` }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Close
          </button>
          <button type="button" className="btn pri" disabled={busy} onClick={onMake}>
            Make a link
          </button>
        </>
      }
    >
      <p>
        Whoever holds the link sees the engine at the saved angle and view, without an account.
        {changed ? ' What you have changed since is not in it: save a version first.' : ''}
      </p>
      <LinkFields {...{ draft, version, may, issues }} changing={false} onChange={(next) => setDraft(next)} />
      {words ? (
        <p className="msg" role="alert">
          {words}
        </p>
      ) : null}
      {made ? (
        <>
          <CopyLine label="The link. It is shown this once: copy it now" what="the address" text={made.url} />
          {made.framed ? (
            <CopyLine
              label="The frame, for a page of one of those sites"
              what="the frame"
              text={frameHtml(made.url, title, frame.width, frame.height)}
            />
          ) : null}
        </>
      ) : null}
      {links && links.length > 0 ? (
        <>
          <LinkTable
            links={links}
            onWithdraw={may.includes('link.revoke') ? (id) => attempt(() => withdraw(id)) : undefined}
          />
          <p>
            <Link href={`/scenes/${sceneId}/links`}>Openings, questions and changes of these links</Link>
          </p>
        </>
      ) : null}
    </Dialog>
  )
}
