'use client'

import { useState } from 'react'
import type { ShareLink } from '@/lib/contracts/share-links'
import { endInWords, kindWords } from './link-draft'

interface Props {
  links: readonly ShareLink[]
  chosen?: string | null
  onChoose?(id: string): void
  onWithdraw?(id: string): void
}

/** The links of a scene, newest first: for whom, what each lets and opens, how often it was opened, how it stands. */
export function LinkTable({ links, chosen, onChoose, onWithdraw }: Props) {
  const [now] = useState(() => Date.now())
  return (
    <div className="issue-list" tabIndex={0} role="region" aria-label="Links of this scene">
      <table className="tab link-table">
        <thead>
          <tr>
            <th scope="col">For</th>
            <th scope="col">Lets</th>
            <th scope="col">Opens</th>
            <th scope="col" className="r">
              Opened
            </th>
            <th scope="col" className="r">
              Asked
            </th>
            <th scope="col">State</th>
            {onWithdraw ? (
              <th scope="col">
                <span className="vh">Withdraw</span>
              </th>
            ) : null}
          </tr>
        </thead>
        <tbody>
          {links.map((link) => (
            <tr
              key={link.id}
              className={link.id === chosen ? 'on' : undefined}
              aria-current={link.id === chosen || undefined}
            >
              <th scope="row">
                {onChoose ? (
                  <button type="button" className="row-button" onClick={() => onChoose(link.id)}>
                    {link.label || 'no name'}
                  </button>
                ) : (
                  link.label || 'no name'
                )}
              </th>
              <td>
                {kindWords[link.kind]}
                {link.locked ? ', password' : ''}
                {link.frameOrigins.length > 0 ? ', framed' : ''}
              </td>
              <td>{link.version === null ? 'latest' : `version ${link.version}`}</td>
              <td className="n">{link.opened}</td>
              <td className="n">{link.questions}</td>
              <td>{endInWords(link, now)}</td>
              {onWithdraw ? (
                <td>
                  {link.state === 'live' ? (
                    <button type="button" className="btn sm warn" onClick={() => onWithdraw(link.id)}>
                      Withdraw
                    </button>
                  ) : null}
                </td>
              ) : null}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
