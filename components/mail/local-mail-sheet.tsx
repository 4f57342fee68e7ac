import { Sheet } from '@/components/shell/sheet'
import { TitleBlock, TitleCell } from '@/components/shell/title-block'

interface KeptMail {
  id: string
  to: string
  subject: string
  text: string
  sentAt: string
}

const time = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short', timeZone: 'UTC' })

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

/** Mail that has gone nowhere: kept on this machine, to be read here. */
export function MailSheet({ mails }: { mails: KeptMail[] }) {
  return (
    <Sheet current="none" className="mails" person={null}>
      <section className="mail-list" aria-label="Mail">
        <h1>Mail kept here</h1>
        <p className="cap">
          This machine sends no mail. Each one it would have sent stands here, the newest first.
        </p>
        {mails.length === 0 ? <p className="state">No mail yet.</p> : null}
        {mails.map((mail) => (
          <article key={mail.id}>
            <h2>{mail.subject}</h2>
            <p className="cap">
              to {mail.to}, {time.format(new Date(mail.sentAt))} UTC
            </p>
            <Lines text={mail.text} />
          </article>
        ))}
      </section>
      <TitleBlock>
        <TitleCell k="On this machine only" span={6} first top>
          <span className="v title">Mail</span>
        </TitleCell>
      </TitleBlock>
    </Sheet>
  )
}
