import { randomUUID } from 'node:crypto'
import type postgres from 'postgres'
import { write } from '@/db/client'
import { keptMails, type KeptMail } from '@/lib/adapters/mail/local'
import { postMail } from '@/lib/services/mail/post-mail'
import { sendMail } from '@/lib/services/mail/send-mail'
import type { Someone } from './people'
import { newEmail } from './server'

/** Sends what waits in the outbox, as a worker does, the oldest first. */
export async function runMails(sql: postgres.Sql): Promise<void> {
  const rows = await sql`select id from mails where state = 'waiting' order by id`
  for (const { id } of rows) await sendMail(id as string)
}

/** The mails to this address in the local post once the outbox has been sent, the newest first. */
export async function mailsTo(sql: postgres.Sql, email: string): Promise<KeptMail[]> {
  await runMails(sql)
  return (await keptMails()).filter(({ to }) => to === email)
}

/** The row of the outbox as it is now. */
export const mailAgain = async (sql: postgres.Sql, row: postgres.Row) =>
  (await sql`select * from mails where id = ${row.id}`)[0]

export interface Posting {
  to?: Someone
  email?: string
  key?: string
  question?: string
}

/** Posts a question to somebody of the workshop or, without one, its copy to an address; answers its row. */
export async function postQuestion(sql: postgres.Sql, { workshopId }: Someone, posting: Posting = {}) {
  const { to, email = newEmail(), key = randomUUID(), question = 'Which?' } = posting
  await write((tx) =>
    to
      ? postMail(tx, {
          template: 'question',
          to: { email: to.email, name: 'Odo', userId: to.id },
          data: {
            ...{ scene: 'V8', visitor: 'Delphine', email: 'delphine@example.com', question, step: null },
            url: 'http://127.0.0.1:3000/s/secret-of-the-link',
          },
          ...{ key, workshopId },
        })
      : postMail(tx, {
          template: 'question-copy',
          to: { email, name: 'Delphine', userId: null },
          data: { workshop: 'Larkspur', question },
          ...{ key, workshopId },
        }),
  )
  return (await sql`select * from mails where key = ${key}`)[0]
}
