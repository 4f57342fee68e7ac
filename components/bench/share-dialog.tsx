'use client'

import { useId, useState } from 'react'
import useSWR from 'swr'
import { Dialog } from '@/components/ui/dialog'
import { Segmented } from '@/components/ui/segmented'
import { addressOf, call, readAddress, Refusal } from '@/lib/contracts/call'
import type { createShareLink, listShareLinks, revokeShareLink, ShareLink } from '@/lib/contracts/share-links'
import type { AnswerOf } from '@/lib/contracts/operation'
import type { Saved } from '@/scene/session/session'

interface Props {
  saved: Saved
  changed: boolean
  title: string
  onClose(): void
}

const states: Record<ShareLink['state'], string> = { live: 'open', ended: 'ended', withdrawn: 'withdrawn' }

/** Links to this scene: make one, see who opened what, withdraw. */
export function ShareDialog({ saved, changed, title, onClose }: Props) {
  const id = useId()
  const [label, setLabel] = useState('')
  const [pinned, setPinned] = useState<'latest' | 'pinned'>('latest')
  const [ends, setEnds] = useState('')
  const [made, setMade] = useState<string | null>(null)
  const [copied, setCopied] = useState(false)
  const [problem, setProblem] = useState<string | null>(null)
  const path = '/api/v1/scenes/{id}/share-links' as const
  const address = addressOf(path, { id: saved.sceneId })
  const { data, mutate } = useSWR(address, readAddress<AnswerOf<typeof listShareLinks>>)

  const attempt = async (act: () => Promise<void>) => {
    setProblem(null)
    try {
      await act()
      await mutate()
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      setProblem(`${error.problem.detail} ${error.problem.cure}`)
    }
  }
  const make = () =>
    attempt(async () => {
      const { url } = await call<typeof createShareLink>({
        method: 'POST',
        path,
        params: { id: saved.sceneId },
        body: {
          label,
          version: pinned === 'pinned' ? saved.version : null,
          endsAt: ends ? new Date(`${ends}T23:59:59`).toISOString() : null,
        },
      })
      setMade(url)
      setCopied(false)
    })
  const withdraw = (link: ShareLink) =>
    attempt(async () => {
      await call<typeof revokeShareLink>({
        method: 'DELETE',
        path: '/api/v1/share-links/{id}',
        params: { id: link.id },
      })
    })
  return (
    <Dialog
      title="Share by a link"
      wide
      about={{ k: 'Scene', v: `${title}, version ${saved.version}` }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Close
          </button>
          <button type="button" className="btn pri" onClick={make}>
            Make a link
          </button>
        </>
      }
    >
      <p>
        Whoever holds the link sees the engine at the saved angle and view, without an account.
        {changed ? ' What you have changed since is not in it: save a version first.' : ''}
      </p>
      <div className="set-out">
        <div className="lf">
          <label htmlFor={`${id}-for`}>For whom or what</label>
          <div className="box">
            <input
              id={`${id}-for`}
              maxLength={120}
              value={label}
              onChange={(event) => setLabel(event.target.value)}
            />
          </div>
        </div>
        <div className="lf">
          <label htmlFor={`${id}-ends`}>Ends after</label>
          <div className="box">
            <input
              id={`${id}-ends`}
              type="date"
              value={ends}
              onChange={(event) => setEnds(event.target.value)}
            />
          </div>
        </div>
        <div className="lf full">
          <span className="lab">Opens</span>
          <Segmented
            label="Opens"
            value={pinned}
            options={[
              { value: 'latest', label: 'the latest version' },
              { value: 'pinned', label: `version ${saved.version} for good` },
            ]}
            onChange={setPinned}
          />
        </div>
      </div>
      {problem ? (
        <p className="msg" role="alert">
          {problem}
        </p>
      ) : null}
      {made ? (
        <div className="lf">
          <label htmlFor={`${id}-made`}>The link. It is shown this once: copy it now</label>
          <div className="box">
            <input
              id={`${id}-made`}
              className="fig"
              readOnly
              value={made}
              onFocus={(event) => event.target.select()}
            />
            <button
              type="button"
              className="btn sm"
              onClick={async () => {
                await navigator.clipboard.writeText(made)
                setCopied(true)
              }}
            >
              {copied ? 'Copied' : 'Copy'}
            </button>
          </div>
        </div>
      ) : null}
      {data && data.links.length > 0 ? (
        <div className="issue-list" tabIndex={0} role="region" aria-label="Links of this scene">
          <table className="tab">
            <thead>
              <tr>
                <th scope="col">For</th>
                <th scope="col">Opens</th>
                <th scope="col" className="r">
                  Opened
                </th>
                <th scope="col">State</th>
                <th scope="col">
                  <span className="vh">Withdraw</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {data.links.map((link) => (
                <tr key={link.id}>
                  <th scope="row">{link.label || 'no name'}</th>
                  <td>{link.version === null ? 'latest' : `version ${link.version}`}</td>
                  <td className="n">{link.opened}</td>
                  <td>{states[link.state]}</td>
                  <td>
                    {link.state === 'live' ? (
                      <button type="button" className="btn sm warn" onClick={() => withdraw(link)}>
                        Withdraw
                      </button>
                    ) : null}
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : null}
    </Dialog>
  )
}
