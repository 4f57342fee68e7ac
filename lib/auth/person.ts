import { read } from '@/db/client'
import { membershipsOf } from '@/db/queries/memberships'
import type { Person } from './access'
import { userOfSession } from './sessions'

/** Who holds this session token, with a role in each of their workshops; null for a stranger. */
export async function personOfToken(token: string | null | undefined): Promise<Person | null> {
  if (!token) return null
  const user = await userOfSession(token)
  if (!user) return null
  return { ...user, memberships: await read((tx) => membershipsOf(tx, user.id)) }
}
