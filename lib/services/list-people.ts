import { read } from '@/db/client'
import { pageOfPeople } from '@/db/queries/people'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { AnswerOf, QueryOf } from '@/lib/contracts/operation'
import type { listPeople as contract } from '@/lib/contracts/workshops'
import { cutPage, readTimeCursor } from './page-cursor'

export async function listPeople(
  person: Person | null,
  workshopId: string,
  { after, limit }: QueryOf<typeof contract>,
): Promise<AnswerOf<typeof contract>> {
  authorise(person, 'person.list', { workshopId }, 'workshop')
  const rows = await read((tx) => pageOfPeople(tx, workshopId, readTimeCursor(after), limit))
  const { shown, next } = cutPage(rows, limit, ({ since: at, id }) => ({ at, id }))
  return {
    people: shown.map((row) => ({ ...row, since: row.since.toISOString(), you: row.id === person.id })),
    next,
  }
}
