import { read, type Transaction } from '@/db/client'
import { membershipsOf } from '@/db/queries/memberships'
import type { Membership, Person } from './access'
import { userOfSession, type SessionUser } from './sessions'

/** The workshop somebody chose, while they belong to it; else the one they have belonged to longest. */
const chosen = (memberships: Membership[], wanted: string | null) =>
  (memberships.find(({ workshopId }) => workshopId === wanted) ?? memberships[0])?.workshopId ?? null

export async function personOfUser(tx: Transaction, user: SessionUser): Promise<Person> {
  const memberships = await membershipsOf(tx, user.id)
  const { id, name, email } = user
  return { id, name, email, memberships, workshopId: chosen(memberships, user.workshopId) }
}

/** Who holds this session token, with a role in each of their workshops; null for a stranger. */
export async function personOfToken(token: string | null | undefined): Promise<Person | null> {
  if (!token) return null
  const user = await userOfSession(token)
  return user && read((tx) => personOfUser(tx, user))
}
