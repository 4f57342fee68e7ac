import { read } from '@/db/client'
import { liveApiToken } from '@/db/queries/api-tokens'
import { lesserRole, type Person } from './access'
import { isStale, markUsed } from './last-seen'
import { hashToken } from './tokens'

/** Whom a program acts for with this token: in one workshop, and never beyond their present role there. */
export async function personOfApiToken(token: string): Promise<Person | null> {
  const found = await read((tx) => liveApiToken(tx, hashToken(token)))
  if (!found) return null
  const role = lesserRole(found.role, found.presentRole)
  if (!role) return null
  if (isStale(found.lastUsedAt)) await markUsed(found.id)
  const { userId: id, name, email, workshopId, workshopName } = found
  return { id, name, email, memberships: [{ workshopId, workshopName, role }], workshopId }
}
