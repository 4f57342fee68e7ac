import { eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { users } from '@/db/schema'
import { roleIn, type Person } from '@/lib/auth/access'
import { notFound, notSignedIn } from '@/lib/errors/problem'

/** Puts one of somebody's workshops before them, here and wherever else they are signed in. */
export async function chooseWorkshop(person: Person | null, workshopId: string): Promise<void> {
  if (!person) throw notSignedIn()
  if (!roleIn(person, workshopId)) throw notFound('workshop')
  await write((tx) => tx.update(users).set({ workshopId }).where(eq(users.id, person.id)))
}
