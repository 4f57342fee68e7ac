import { and, inArray, lt } from 'drizzle-orm'
import { write } from '@/db/client'
import { mails } from '@/db/schema'
import { queueMail } from './queue-mail'

const day = 86_400_000

/** Mails that still wait after a day have lost their job, as when the database was away at each of its attempts. */
export const requeueLeft = (now = new Date()): Promise<void> =>
  write(async (tx) => {
    const left = await tx
      .select({ id: mails.id })
      .from(mails)
      .where(
        and(inArray(mails.state, ['waiting', 'sending']), lt(mails.createdAt, new Date(now.getTime() - day))),
      )
      .limit(500)
    for (const { id } of left) await queueMail(tx, id)
  })
