import { and, inArray, isNotNull, lt, or } from 'drizzle-orm'
import { write } from '@/db/client'
import { mails, unsubscribeTokens } from '@/db/schema'
import { emptied } from './send-mail'

const day = 86_400_000
/** How long what a mail says is kept for a person to send it again; a link that has ended is gone before. */
const keptDays = 14
/** A mail may be read long after it was sent: so long its address turns its kind off. */
const tokenDays = 400

/** Lets go of what nobody will send any more, and of tokens nobody will use. */
export const forgetMails = (now = new Date()): Promise<void> =>
  write(async (tx) => {
    const before = (days: number) => new Date(now.getTime() - days * day)
    await tx
      .update(mails)
      .set(emptied)
      .where(
        and(
          isNotNull(mails.data),
          inArray(mails.state, ['failed', 'unsure']),
          or(lt(mails.createdAt, before(keptDays)), lt(mails.endsAt, now)),
        ),
      )
    await tx.delete(unsubscribeTokens).where(lt(unsubscribeTokens.createdAt, before(tokenDays)))
  })
