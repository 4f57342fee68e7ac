import { read } from '@/db/client'
import { pageOfInvitations } from '@/db/queries/invitations'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { listInvitations as contract } from '@/lib/contracts/invitations'
import type { AnswerOf, QueryOf } from '@/lib/contracts/operation'
import { invitationAnswer } from './invitation-answer'
import { cutPage, readTimeCursor } from './page-cursor'

export async function listInvitations(
  person: Person | null,
  workshopId: string,
  { after, limit }: QueryOf<typeof contract>,
): Promise<AnswerOf<typeof contract>> {
  authorise(person, 'person.invite', { workshopId }, 'workshop')
  const rows = await read((tx) => pageOfInvitations(tx, workshopId, readTimeCursor(after), limit))
  const { shown, next } = cutPage(rows, limit, ({ invitation: { createdAt: at, id } }) => ({ at, id }))
  const now = new Date()
  return { invitations: shown.map((row) => invitationAnswer(row, now)), next }
}
