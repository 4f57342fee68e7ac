import type { Transaction } from '@/db/client'
import { addJob } from '@/lib/queue/add-job'

/** Some three and a half hours with the queue's growing waits. */
export const mostAttempts = 10

/** The queue may run it a little oftener than the outbox counts: a worker can die before it has counted. */
export const queueMail = (tx: Transaction, mailId: string) =>
  addJob(tx, 'mail.send', { mailId }, { key: `mail:${mailId}`, maxAttempts: mostAttempts + 5 })
