import { eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { mails } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { OutboxMail } from '@/lib/contracts/mail'
import { Problem } from '@/lib/errors/problem'
import { audit } from '../audit'
import { canGoAgain, outboxMail } from './outbox-mail'
import { queueMail } from './queue-mail'

/** A person's decision to send once more what failed, or what may have gone already. */
export const resendMail = (person: Person | null, id: string): Promise<OutboxMail> =>
  write(async (tx) => {
    const [row] = await tx.select().from(mails).where(eq(mails.id, id)).for('update')
    const of = row?.workshopId ? { workshopId: row.workshopId } : undefined
    authorise(person, 'mail.resend', of, 'mail')
    if (!canGoAgain(row)) {
      throw new Problem(
        'conflict',
        row.data === null
          ? 'What this mail said is not kept any more.'
          : 'This mail is on its way: it goes again only after it has failed, or when nobody knows whether it went.',
        'Look at the list again; or do again what it was sent for.',
      )
    }
    const [again] = await tx
      .update(mails)
      .set({ state: 'waiting', attempts: 0, lastError: null })
      .where(eq(mails.id, id))
      .returning()
    await queueMail(tx, id)
    await audit(tx, {
      actorId: person.id,
      workshopId: row.workshopId,
      operation: 'mail.resend',
      subject: `mail:${id}`,
      before: { state: row.state, lastError: row.lastError },
    })
    return outboxMail(again)
  })
