import { read } from '@/db/client'
import { workshopById } from '@/db/queries/people'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { WorkshopAnswer } from '@/lib/contracts/workshops'
import { notFound } from '@/lib/errors/problem'
import { workshopAnswer } from './workshop-answer'

export async function readWorkshop(person: Person | null, id: string): Promise<WorkshopAnswer> {
  authorise(person, 'workshop.read', { workshopId: id }, 'workshop')
  const row = await read((tx) => workshopById(tx, id))
  if (!row) throw notFound('workshop')
  return workshopAnswer(row, person)
}
