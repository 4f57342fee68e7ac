'use client'

import { useState } from 'react'
import { useSlip } from '@/components/ui/slips'
import { Tabs } from '@/components/ui/tabs'
import type { Operation } from '@/lib/auth/access'
import type { ShareLink } from '@/lib/contracts/share-links'
import { bodyOf, draftOf } from './link-draft'
import { LinkFields } from './link-fields'
import { OpeningsLog } from './openings-log'
import { QuestionsLog } from './questions-log'
import { useAttempt } from './use-attempt'
import type { useLinks } from './use-links'

interface Props {
  link: ShareLink
  headVersion: number
  may: readonly Operation[]
  links: ReturnType<typeof useLinks>
}

/** One link: who opened it, what they asked, and what it lets. */
export function LinkDetail({ link, headVersion, may, links }: Props) {
  const [tab, setTab] = useState<'openings' | 'questions' | 'options'>('openings')
  const erase = (what: 'openings' | 'questions') =>
    may.includes('link.erase') ? () => links.erase(link.id, what) : undefined
  return (
    <section className="link-detail" aria-label={`Link for ${link.label || 'no name'}`}>
      <h2>{link.label || 'Link without a name'}</h2>
      <Tabs
        label="Of this link"
        value={tab}
        tabs={[
          { value: 'openings', label: 'Openings' },
          { value: 'questions', label: 'Questions' },
          { value: 'options', label: 'What it lets' },
        ]}
        onChange={setTab}
      >
        {tab === 'openings' ? <OpeningsLog link={link} onErase={erase('openings')} /> : null}
        {tab === 'questions' ? <QuestionsLog link={link} onErase={erase('questions')} /> : null}
        {tab === 'options' ? <Options {...{ link, headVersion, may, links }} /> : null}
      </Tabs>
    </section>
  )
}

function Options({ link, headVersion, may, links }: Props) {
  const [draft, setDraft] = useState(() => draftOf(link))
  const { attempt, busy, issues, words } = useAttempt()
  const slip = useSlip()
  if (link.state === 'withdrawn')
    return <p>Withdrawn for good by its workshop: it opens nothing, and is not changed any more.</p>
  const version = link.version ?? headVersion
  const keep = () =>
    attempt(async () => {
      await links.change(link.id, bodyOf(draft, version, Date.now()))
      setDraft((now) => ({
        ...now,
        ends: 'kept',
        lock: now.lock === 'new' ? 'kept' : now.lock,
        password: '',
      }))
      slip({ text: 'The link is changed, for whoever has it open too.' })
    })
  const withdraw = () => attempt(() => links.withdraw(link.id))
  return (
    <>
      <LinkFields {...{ draft, version, may, issues }} changing onChange={setDraft} />
      {words ? (
        <p className="msg" role="alert">
          {words}
        </p>
      ) : null}
      <p className="link-acts">
        {may.includes('link.revoke') ? (
          <button type="button" className="btn warn" disabled={busy} onClick={withdraw}>
            Withdraw link
          </button>
        ) : null}
        {may.includes('link.change') ? (
          <button type="button" className="btn pri" disabled={busy} onClick={keep}>
            {link.state === 'ended' ? 'Open it again' : 'Change the link'}
          </button>
        ) : null}
      </p>
    </>
  )
}
