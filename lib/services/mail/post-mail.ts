import type { Transaction } from '@/db/client'
import { mails, unsubscribeTokens } from '@/db/schema'
import { newId } from '@/db/schema/columns'
import { hashToken, newToken } from '@/lib/auth/tokens'
import { config } from '@/lib/config'
import { letterData, type LetterData, type LetterName } from '@/lib/letters/letter-data'
import { kindOf } from '@/lib/letters/mail-kinds'
import { queueMail } from './queue-mail'

interface Posted<Name extends LetterName> {
  template: Name
  /** Without a user it is somebody who has no account, or need not have one. */
  to: { email: string; name: string; userId: string | null }
  data: LetterData[Name]
  /** Names what caused it: the same key twice is one mail. */
  key: string
  /** Whose outbox shows it; null for what is between a person and the program alone. */
  workshopId: string | null
}

/**
 * Puts a letter into the outbox in the caller's own transaction: it will be sent if that commits, and never if not.
 */
export async function postMail<Name extends LetterName>(
  tx: Transaction,
  posted: Posted<Name>,
): Promise<void> {
  const { template, to, key, workshopId } = posted
  const data: LetterData[LetterName] = letterData[template].parse(posted.data)
  const id = newId()
  const kind = kindOf(template)
  const token = kind && to.userId ? newToken() : null
  const [row] = await tx
    .insert(mails)
    .values({
      ...{ id, key, template, data, workshopId },
      ...{ toEmail: to.email, toName: to.name, userId: to.userId },
      messageId: `<${id}@${new URL(config().origin).hostname}>`,
      unsubscribeToken: token,
      endsAt: endOf(data),
    })
    .onConflictDoNothing({ target: mails.key })
    .returning({ id: mails.id })
  if (!row) return
  if (kind && to.userId && token) {
    await tx.insert(unsubscribeTokens).values({ tokenHash: hashToken(token), userId: to.userId, kind })
  }
  await queueMail(tx, row.id)
}

/** When the link in it leads nowhere any more. */
function endOf(data: LetterData[LetterName]): Date | null {
  if ('endsAt' in data) return new Date(data.endsAt)
  if ('minutes' in data) return new Date(Date.now() + data.minutes * 60_000)
  return null
}
