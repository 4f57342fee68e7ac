'use client'

import { usePages } from '@/components/ui/use-pages'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { ShareLink } from '@/lib/contracts/share-links'
import { openingsAddress, type OpeningsPage } from './use-links'

interface Props {
  link: ShareLink
  /** Absent where the role does not include it. */
  onErase?(): Promise<void>
}

const when = new Intl.DateTimeFormat('en-GB', {
  ...{ day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' },
  timeZoneName: 'short',
})

const spent = (seconds: number) =>
  seconds < 60 ? `${seconds} s` : `${Math.floor(seconds / 60)} min ${seconds % 60} s`

/** When a link was opened, on what kind of device, and for how long each part of the page was in view. */
export function OpeningsLog({ link, onErase }: Props) {
  const address = openingsAddress(link.id)
  const { pages, error, more, refresh } = usePages<OpeningsPage>(
    (before) => addressOf(address, {}, { limit: 50, before }),
    readAddress,
  )
  if (error) return <p className="msg">{error.message}</p>
  if (!pages) return <p className="setting-out">Setting out</p>
  const openings = pages.flatMap((page) => page.openings)
  return (
    <div className="link-log">
      <p className="cap">
        Kept for {pages[0].keptDays} days. The workshop’s own people and robots are left out; no address or
        place is taken.
      </p>
      {openings.length === 0 ? (
        <p>Nobody has had it before them yet, or it is no longer kept.</p>
      ) : (
        <div className="twin" tabIndex={0} role="region" aria-label="Openings">
          <table className="tab">
            <thead>
              <tr>
                <th scope="col">Opened</th>
                <th scope="col">On</th>
                <th scope="col" className="r">
                  Version
                </th>
                {['Drawing', 'Figures', 'Notes'].map((part) => (
                  <th scope="col" className="r" key={part}>
                    {part}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {openings.map((one) => (
                <tr key={one.id}>
                  <th scope="row">{when.format(new Date(one.openedAt))}</th>
                  <td>{one.device}</td>
                  <td className="n">{one.version}</td>
                  {[one.drawingSeconds, one.figuresSeconds, one.notesSeconds].map((seconds, index) => (
                    <td className="n" key={index}>
                      {spent(seconds)}
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      <p className="link-acts">
        {more ? (
          <button type="button" className="btn sm" onClick={more}>
            Earlier ones
          </button>
        ) : null}
        <a className="btn sm" href={`${address}.csv`} download>
          Save as CSV
        </a>
        <a className="btn sm" href={`${address}.json`} download>
          Save as JSON
        </a>
        {onErase && (openings.length > 0 || link.opened > 0) ? (
          <button
            type="button"
            className="btn sm warn"
            onClick={async () => {
              await onErase()
              await refresh()
            }}
          >
            Erase all of them
          </button>
        ) : null}
      </p>
    </div>
  )
}
