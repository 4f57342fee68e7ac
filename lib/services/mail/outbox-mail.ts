import type { mails } from '@/db/schema'
import type { OutboxMail } from '@/lib/contracts/mail'
import { letterNameSchema } from '@/lib/letters/letter-data'

type Row = typeof mails.$inferSelect

export const canGoAgain = ({ state, data }: Row) =>
  (state === 'failed' || state === 'unsure') && data !== null

/** A mail as its workshop's owner sees it: whom it is for and how it went, not what it says. */
export const outboxMail = (row: Row): OutboxMail => ({
  id: row.id,
  letter: letterNameSchema.parse(row.template),
  to: row.toName ? `${row.toName} (${row.toEmail})` : row.toEmail,
  state: row.state,
  attempts: row.attempts,
  lastError: row.lastError,
  createdAt: row.createdAt.toISOString(),
  sentAt: row.sentAt?.toISOString() ?? null,
  again: canGoAgain(row),
})
