import { and, asc, eq, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { memberships, scenes, shareLinks, users } from '../schema'

/** Who hears what comes in by a link: who made it or, when they have left the workshop, its first owner. */
export async function hearerOfLink(tx: Transaction, linkId: string) {
  const [hearer] = await tx
    .select({ userId: users.id, name: users.name, email: users.email })
    .from(shareLinks)
    .innerJoin(scenes, eq(scenes.id, shareLinks.sceneId))
    .innerJoin(memberships, eq(memberships.workshopId, scenes.workshopId))
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(
      and(
        eq(shareLinks.id, linkId),
        sql`(${users.id} = ${shareLinks.createdBy} or ${memberships.role} = 'owner')`,
      ),
    )
    .orderBy(sql`${users.id} = ${shareLinks.createdBy} desc`, asc(memberships.createdAt), asc(users.id))
    .limit(1)
  return hearer
}
