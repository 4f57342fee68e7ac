import { eq } from 'drizzle-orm'
import { read, write } from '@/db/client'
import { mails } from '@/db/schema'
import { MailRefused, type Mailer } from '@/lib/adapters/mail/port'
import type { Person } from '@/lib/auth/access'
import { postMail } from '../mail/post-mail'
import { sendMail } from '../mail/send-mail'

interface Urls {
  live: string
  /** Of the link that went to an address with a slip in it. */
  astray: string
}

const noSuchMailbox: Mailer = {
  repeatable: false,
  send: () => Promise.reject(new MailRefused('550 5.1.1 No such mailbox here.')),
}

/** The mail with a link, to be read in the local post, and one before it that a mail server would not take. */
export async function sendLinks(sender: Person, scene: string, urls: Urls): Promise<void> {
  const { workshopId, workshopName } = sender.memberships[0]
  const send = (key: string, email: string, url: string) =>
    write((tx) =>
      postMail(tx, {
        template: 'link',
        to: { email, name: 'Delphine', userId: null },
        data: {
          ...{ sender: sender.name, workshop: workshopName, scene, url },
          message: 'Here is the cross-plane engine we talked about, running.',
        },
        ...{ key, workshopId },
      }),
    )
  await send('demo:link-astray', 'delphin@example.com', urls.astray)
  const [astray] = await read((tx) =>
    tx.select({ id: mails.id }).from(mails).where(eq(mails.key, 'demo:link-astray')),
  )
  await sendMail(astray.id, noSuchMailbox)
  await send('demo:link', 'delphine@example.com', urls.live)
}
