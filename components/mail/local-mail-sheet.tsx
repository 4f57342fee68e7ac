'use client'

import { useState } from 'react'
import useSWR from 'swr'
import { Sheet } from '@/components/shell/sheet'
import { TitleBlock, TitleCell } from '@/components/shell/title-block'
import { Segmented } from '@/components/ui/segmented'
import { readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'
import type { localMail } from '@/lib/contracts/system'
import { timeWords } from './time-words'

type Mails = AnswerOf<typeof localMail>
type LocalMail = Mails['mails'][number]

/** Addresses in a mail become links. */
function Lines({ text }: { text: string }) {
  return (
    <p className="mail-text">
      {text.split(/(https?:\/\/\S+)/).map((piece, index) =>
        index % 2 ? (
          <a key={index} href={piece}>
            {piece}
          </a>
        ) : (
          piece
        ),
      )}
    </p>
  )
}

/** As a mail program shows it: nothing in it runs, and its links open in place of this page. */
const Page = ({ subject, html }: LocalMail) => (
  <iframe
    className="mail-page"
    title={subject}
    sandbox="allow-top-navigation-by-user-activation"
    srcDoc={html.replace('<head>', '<head><base target="_top">')}
  />
)

/** Mail that has gone nowhere: kept on this machine, to be read here. */
export function LocalMailSheet({ first }: { first: Mails }) {
  const [as, setAs] = useState<'text' | 'page'>('text')
  const { data } = useSWR<Mails>('/api/v1/local/mail', readAddress, {
    fallbackData: first,
    refreshInterval: 1000,
  })
  const { mails } = data ?? first
  return (
    <Sheet current="none" className="mails" person={null}>
      <section className="mail-list" aria-label="Mail">
        <h1>Mail kept here</h1>
        <p className="cap">
          This machine sends no mail. Each one it would have sent stands here, the newest first.
        </p>
        {mails.length === 0 ? <p className="state">No mail yet.</p> : null}
        {mails.map((mail) => (
          <article key={mail.id} aria-label={mail.subject}>
            <h2>{mail.subject}</h2>
            <p className="cap">
              to {mail.to}, {timeWords(mail.sentAt)}
            </p>
            {as === 'text' ? <Lines text={mail.text} /> : <Page {...mail} />}
          </article>
        ))}
      </section>
      <TitleBlock>
        <TitleCell k="On this machine only" span={3} first top>
          <span className="v title">Mail</span>
        </TitleCell>
        <TitleCell k="Shown as" span={3} top>
          <Segmented
            label="Shown as"
            value={as}
            options={[
              { value: 'text', label: 'Text' },
              { value: 'page', label: 'HTML' },
            ]}
            onChange={setAs}
          />
        </TitleCell>
      </TitleBlock>
    </Sheet>
  )
}
