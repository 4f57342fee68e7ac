'use client'

import { usePages } from '@/components/ui/use-pages'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { ShareLink } from '@/lib/contracts/share-links'
import { questionsAddress, type QuestionsPage } from './use-links'

interface Props {
  link: ShareLink
  onErase?(): Promise<void>
}

const when = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short' })

/** What visitors asked on a link's page, with what was before them. */
export function QuestionsLog({ link, onErase }: Props) {
  const { pages, error, more, refresh } = usePages<QuestionsPage>(
    (before) => addressOf(questionsAddress(link.id), {}, { limit: 50, before }),
    readAddress,
  )
  if (error) return <p className="msg">{error.message}</p>
  if (!pages) return <p className="setting-out">Setting out</p>
  const questions = pages.flatMap((page) => page.questions)
  if (questions.length === 0) return <p>Nothing has been asked yet.</p>
  return (
    <div className="link-log">
      <ul className="asked-list">
        {questions.map((one) => (
          <li key={one.id}>
            <p className="cap">
              {one.name}, <a href={`mailto:${one.email}`}>{one.email}</a>,{' '}
              {when.format(new Date(one.askedAt))}, version {one.version}
              {one.angleDeg === null ? '' : `, at ${one.angleDeg.toFixed(1)}°`}
            </p>
            <p className="asked">{one.question}</p>
          </li>
        ))}
      </ul>
      <p className="link-acts">
        {more ? (
          <button type="button" className="btn sm" onClick={more}>
            Earlier ones
          </button>
        ) : null}
        {onErase ? (
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
