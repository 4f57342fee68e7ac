import { eq } from 'drizzle-orm'
import { write, type Transaction } from '@/db/client'
import { memberships, users, workshops } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { notSignedIn, Problem } from '@/lib/errors/problem'
import { audit } from './audit'

/** As many as one person may belong to by their own doing: more is a mistake, or somebody filling the disk. */
const mostWorkshops = 20

/** A workshop with its first owner, and before them from now on. */
export async function insertWorkshop(tx: Transaction, ownerId: string, name: string): Promise<string> {
  const [{ id }] = await tx.insert(workshops).values({ name }).returning({ id: workshops.id })
  await tx.insert(memberships).values({ workshopId: id, userId: ownerId, role: 'owner' })
  await tx.update(users).set({ workshopId: id }).where(eq(users.id, ownerId))
  await audit(tx, {
    actorId: ownerId,
    workshopId: id,
    operation: 'workshop.create',
    subject: `workshop:${id}`,
    after: { name },
  })
  return id
}

export async function createWorkshop(person: Person | null, name: string): Promise<string> {
  if (!person) throw notSignedIn()
  return write(async (tx) => {
    // held, so that many at once are counted too
    await tx.select({ id: users.id }).from(users).where(eq(users.id, person.id)).for('no key update')
    const held = await tx.$count(memberships, eq(memberships.userId, person.id))
    if (held >= mostWorkshops) {
      const detail = `You belong to ${held} workshops, as many as one person may.`
      throw new Problem('held', detail, 'Leave one that is of no more use, then try again.')
    }
    return insertWorkshop(tx, person.id, name)
  })
}
