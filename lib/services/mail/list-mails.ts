import { and, desc, eq, lt, notInArray } from 'drizzle-orm'
import { z } from 'zod'
import { read } from '@/db/client'
import { mails } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { listMails as contract } from '@/lib/contracts/mail'
import type { AnswerOf, QueryOf } from '@/lib/contracts/operation'
import { Problem } from '@/lib/errors/problem'
import { workshopOf } from '../workshop-of'
import { outboxMail } from './outbox-mail'

/** Ids begin with the time: the last one of a page is where the next begins. */
function readCursor(text: string | undefined) {
  if (text === undefined) return undefined
  const id = z.uuid().safeParse(text)
  if (id.success) return id.data
  throw new Problem('unreadable', 'The page asked for cannot be found.', 'Begin again without `after`.')
}

export async function listMails(
  person: Person | null,
  { workshop, show, after, limit }: QueryOf<typeof contract>,
): Promise<AnswerOf<typeof contract>> {
  const workshopId = person ? workshopOf(person, workshop) : ''
  authorise(person, 'mail.read', { workshopId }, 'workshop')
  const before = readCursor(after)
  const rows = await read((tx) =>
    tx
      .select()
      .from(mails)
      .where(
        and(
          eq(mails.workshopId, workshopId),
          show === 'open' ? notInArray(mails.state, ['sent', 'held']) : undefined,
          before === undefined ? undefined : lt(mails.id, before),
        ),
      )
      .orderBy(desc(mails.id))
      .limit(limit + 1),
  )
  const page = rows.slice(0, limit)
  return { mails: page.map(outboxMail), next: rows.length > limit ? page[page.length - 1].id : null }
}
