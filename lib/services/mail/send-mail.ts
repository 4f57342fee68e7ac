import { randomUUID } from 'node:crypto'
import { and, eq, inArray, sql } from 'drizzle-orm'
import { write, type Transaction } from '@/db/client'
import { mails } from '@/db/schema'
import { mailer } from '@/lib/adapters/mail'
import { MailRefused, MailUnsure, type Mailer } from '@/lib/adapters/mail/port'
import { wantsMail } from './wants-mail'
import { mostAttempts } from './queue-mail'
import { mailOf } from './mail-of'

export type MailRow = typeof mails.$inferSelect

/** A mail that is over needs nothing of what it was made of. */
export const emptied = { data: null, unsubscribeToken: null }

const unanswered =
  'The worker that was sending it ended before it knew whether the mail server had taken it. It may have arrived.'

/**
 * Sends one mail of the outbox: claims it in a transaction, hands it over outside of one, and writes down how it went.
 *
 * Between handing over and writing down a worker can be killed, and its row stays `sending`. Whoever finds it so (the
 * queue gives a job to one worker at a time, so the former one is gone) asks the adapter: one that knows a mail again
 * (`repeatable`) is simply given it once more, exactly once in effect. A mail server does not, so such a mail is sent at
 * most once: it becomes `unsure`, and a person decides whether it goes again.
 */
export async function sendMail(mailId: string, by: Mailer = mailer()): Promise<void> {
  const claim = randomUUID()
  const row = await write((tx) => claimMail(tx, mailId, claim, by.repeatable))
  if (!row) return
  try {
    await by.send(mailOf(row))
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error)
    const over = error instanceof MailRefused || row.attempts >= mostAttempts
    const state = error instanceof MailUnsure ? 'unsure' : over ? 'failed' : 'waiting'
    await write((tx) => settle(tx, row.id, claim, { state, lastError: message.slice(0, 500) }))
    // the queue runs what has thrown again, after a wait that grows
    if (state === 'waiting') throw error
    return
  }
  await write((tx) =>
    settle(tx, row.id, claim, { state: 'sent', sentAt: new Date(), lastError: null, ...emptied }),
  )
}

/** Only whoever holds the claim says how it went; also of one that others have meanwhile given up as unsure. */
async function settle(tx: Transaction, id: string, claim: string, outcome: Partial<MailRow>) {
  await tx
    .update(mails)
    .set(outcome)
    .where(and(eq(mails.id, id), eq(mails.claim, claim), inArray(mails.state, ['sending', 'unsure'])))
}

async function claimMail(tx: Transaction, id: string, claim: string, repeatable: boolean) {
  const [row] = await tx.select().from(mails).where(eq(mails.id, id)).for('update')
  if (!row || (row.state !== 'waiting' && row.state !== 'sending')) return null
  const set = async (values: Partial<MailRow>) => {
    await tx.update(mails).set(values).where(eq(mails.id, id))
    return null
  }
  if (row.state === 'sending' && !repeatable) return set({ state: 'unsure', lastError: unanswered })
  if (row.endsAt && row.endsAt <= new Date()) {
    return set({ state: 'failed', lastError: 'What it leads to ended before it could be sent.', ...emptied })
  }
  if (!(await wantsMail(tx, row))) return set({ state: 'held', ...emptied })
  if (row.attempts >= mostAttempts) return set({ state: 'failed' })
  const [claimed] = await tx
    .update(mails)
    .set({ state: 'sending', claim, claimedAt: new Date(), attempts: sql`${mails.attempts} + 1` })
    .where(eq(mails.id, id))
    .returning()
  return claimed
}
