import type { mails } from '@/db/schema'
import type { Mail } from '@/lib/adapters/mail/port'
import { config } from '@/lib/config'
import { letterNameSchema } from '@/lib/letters/letter-data'
import { writeLetter } from '@/lib/letters/write-letter'

/** The same row is the same mail, to the letter, however often it is tried. */
export function mailOf(row: typeof mails.$inferSelect): Mail {
  const { origin, mail } = config()
  const token = row.unsubscribeToken
  const { subject, text, html, replyTo, headers } = writeLetter(
    letterNameSchema.parse(row.template),
    row.data,
    {
      name: row.toName,
      unsubscribe:
        token === null
          ? null
          : {
              pageUrl: `${origin}/unsubscribe?token=${token}`,
              postUrl: `${origin}/api/v1/unsubscribe/${token}`,
            },
    },
  )
  return {
    ...{
      id: row.id,
      messageId: row.messageId,
      from: mail.from,
      to: { name: row.toName, email: row.toEmail },
    },
    ...{ subject, text, html, replyTo, headers },
  }
}
