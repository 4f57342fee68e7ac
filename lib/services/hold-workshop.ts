import type { Transaction } from '@/db/client'
import { membershipsOf } from '@/db/queries/memberships'
import { lockWorkshop, type WorkshopRow } from '@/db/queries/people'
import type { Operation, Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { notFound, notSignedIn } from '@/lib/errors/problem'

/**
 * The workshop, held until the transaction ends, for somebody who may do this to it: by what they came with, and
 * still, now that nobody else can change who belongs to it.
 */
export async function holdWorkshop(
  tx: Transaction,
  person: Person | null,
  operation: Operation,
  workshopId: string,
): Promise<{ workshop: WorkshopRow; person: Person }> {
  if (!person) throw notSignedIn()
  authorise(person, operation, { workshopId }, 'workshop')
  const workshop = await lockWorkshop(tx, workshopId)
  const memberships = await membershipsOf(tx, person.id)
  authorise({ ...person, memberships }, operation, workshop && { workshopId }, 'workshop')
  if (!workshop) throw notFound('workshop')
  return { workshop, person }
}
