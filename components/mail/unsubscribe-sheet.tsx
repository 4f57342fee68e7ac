'use client'

import Link from 'next/link'
import { useState, type FormEvent } from 'react'
import { GuestSheet } from '@/components/shell/guest-sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { kindWords, type MailKind } from '@/lib/letters/mail-kinds'

interface Props {
  token: string
  /** Null where the address is not known. */
  kind: MailKind | null
}

type Course = 'asked' | 'sending' | 'off' | 'failed'

const sentences: Record<Course, string> = {
  asked: 'Each kind of mail can be turned on again under Account.',
  sending: 'Each kind of mail can be turned on again under Account.',
  off: 'They are turned off. Under Account they can be turned on again.',
  failed: 'The server did not answer, and nothing has changed. Check the connection and try again.',
}

/** Asks before it turns a kind of mail off: programs that look at every address in a mail must not. */
export function UnsubscribeSheet({ token, kind }: Props) {
  const [course, setCourse] = useState<Course>('asked')
  const turnOff = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const { action } = event.currentTarget
    setCourse('sending')
    const body = new URLSearchParams({ 'List-Unsubscribe': 'One-Click' })
    const response = await fetch(action, { method: 'POST', body }).catch(() => null)
    setCourse(response?.ok ? 'off' : 'failed')
  }
  return (
    <GuestSheet brand="Counterthrow" className="gone">
      <div className="state" role="status">
        {kind ? (
          <p>
            <b>{kindWords[kind]}</b>
            <br />
            {sentences[course]}
          </p>
        ) : (
          <p>
            <b>This address turns nothing off.</b>
            <br />
            Take the one from the newest mail, or choose under Account which mails you get.
          </p>
        )}
      </div>
      <TitleBlock>
        <TitleCell k="Mail" span={6} first top>
          <h1 className="v title">
            {!kind ? 'Nothing to turn off' : course === 'off' ? 'Turned off' : 'Turn these mails off'}
          </h1>
        </TitleCell>
        <TitleActions note={<Link href="/account">Account</Link>}>
          {kind && course !== 'off' ? (
            <form
              method="post"
              action={`/api/v1/unsubscribe/${encodeURIComponent(token)}`}
              onSubmit={(event) => void turnOff(event)}
            >
              <input type="hidden" name="List-Unsubscribe" value="One-Click" />
              <button type="submit" className="btn pri" disabled={course === 'sending'}>
                Turn off
              </button>
            </form>
          ) : null}
        </TitleActions>
      </TitleBlock>
    </GuestSheet>
  )
}
