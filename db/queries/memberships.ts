import { asc, eq } from 'drizzle-orm'
import type { Transaction } from '../client'
import { memberships, workshops } from '../schema'

/** A person's workshops, the oldest membership first. */
export const membershipsOf = (tx: Transaction, userId: string) =>
  tx
    .select({ workshopId: workshops.id, workshopName: workshops.name, role: memberships.role })
    .from(memberships)
    .innerJoin(workshops, eq(workshops.id, memberships.workshopId))
    .where(eq(memberships.userId, userId))
    .orderBy(asc(memberships.createdAt), asc(workshops.id))
