'use client'

import { useId, useState } from 'react'
import { Segmented } from '@/components/ui/segmented'
import { usePages } from '@/components/ui/use-pages'
import type { Operation } from '@/lib/auth/access'
import { addressOf, call, readAddress, type Refusal } from '@/lib/contracts/call'
import type { listMails, OutboxMail, resendMail } from '@/lib/contracts/mail'
import type { AnswerOf } from '@/lib/contracts/operation'
import { letterWords } from '@/lib/letters/letter-words'
import { timeWords } from './time-words'

type Page = AnswerOf<typeof listMails>
type Show = 'open' | 'all'

const stateWords: Record<OutboxMail['state'], string> = {
  waiting: 'Waits',
  sending: 'Is being sent',
  sent: 'Sent',
  failed: 'Failed',
  unsure: 'May have gone',
  held: 'Not sent: turned off, or no longer of this workshop',
}

interface Props {
  workshopId: string
  may: readonly Operation[]
}

/** What a workshop's mails have become, for its owners: which wait, which failed and why, and sending again. */
export function OutboxSection({ workshopId, may }: Props) {
  return may.includes('mail.read') ? <Outbox workshopId={workshopId} may={may} /> : null
}

function Outbox({ workshopId, may }: Props) {
  const id = useId()
  const [show, setShow] = useState<Show>('open')
  const [refused, setRefused] = useState<string | null>(null)
  const { pages, error, more, refresh } = usePages<Page>(
    (after) => addressOf('/api/v1/mails', {}, { workshop: workshopId, show, after }),
    readAddress,
  )
  const mails = pages?.flatMap((page) => page.mails) ?? []

  const sendAgain = async ({ id }: OutboxMail) => {
    setRefused(null)
    try {
      await call<typeof resendMail>({ method: 'POST', path: '/api/v1/mails/{id}/resend', params: { id } })
    } catch (cause) {
      const { message, problem } = cause as Refusal
      setRefused(`${message} ${problem.cure}`)
    }
    await refresh()
  }

  return (
    <section className="outbox" aria-labelledby={id}>
      <div className="outbox-head">
        <h2 id={id}>Mail sent from here</h2>
        <Segmented
          label="Which mails"
          value={show}
          options={[
            { value: 'open', label: 'Not sent yet' },
            { value: 'all', label: 'All' },
          ]}
          onChange={setShow}
        />
      </div>
      {refused || (error && !pages) ? (
        <p className="refused" role="alert">
          {refused ?? error?.message}
        </p>
      ) : null}
      {pages && mails.length === 0 ? (
        <p className="cap">{show === 'open' ? 'Nothing waits and nothing failed.' : 'No mail yet.'}</p>
      ) : null}
      {mails.length > 0 ? (
        <div className="outbox-rows" tabIndex={0} role="region" aria-label="Mails">
          <table className="tab">
            <thead>
              <tr>
                {['What', 'To', 'Made', 'State', 'What stood in the way'].map((head) => (
                  <th key={head} scope="col">
                    {head}
                  </th>
                ))}
                {may.includes('mail.resend') ? (
                  <th scope="col">
                    <span className="vh">Again</span>
                  </th>
                ) : null}
              </tr>
            </thead>
            <tbody>
              {mails.map((mail) => (
                <tr key={mail.id}>
                  <th scope="row">{letterWords[mail.letter]}</th>
                  <td className="outbox-to">{mail.to}</td>
                  <td className="fig">{timeWords(mail.createdAt)}</td>
                  <td>
                    {stateWords[mail.state]}
                    {mail.attempts > 1 ? `, tried ${mail.attempts} times` : ''}
                  </td>
                  <td>{mail.lastError}</td>
                  {may.includes('mail.resend') ? (
                    <td>
                      {mail.again ? (
                        <button type="button" className="btn sm" onClick={() => void sendAgain(mail)}>
                          Send again
                        </button>
                      ) : null}
                    </td>
                  ) : null}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : null}
      {more ? (
        <button type="button" className="btn" onClick={more}>
          Earlier mails
        </button>
      ) : null}
    </section>
  )
}
