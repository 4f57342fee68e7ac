import { and, eq, isNull, sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { linkById } from '@/db/queries/share-links'
import { shareLinks } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import type { ShareLink } from '@/lib/contracts/share-links'
import { notFound } from '@/lib/errors/problem'
import { audit } from './audit'
import { linkOf } from './link-of'
import { shareLinkAnswer } from './share-link-answer'

/** From now on it opens nothing, for good. Withdrawing it again changes nothing. */
export async function revokeShareLink(person: Person | null, id: string): Promise<ShareLink> {
  return write(async (tx) => {
    const { scene, person: by } = await linkOf(tx, person, 'link.revoke', id)
    const revoked = await tx
      .update(shareLinks)
      .set({ revokedAt: sql`now()` })
      .where(and(eq(shareLinks.id, id), isNull(shareLinks.revokedAt)))
      .returning({ revokedAt: shareLinks.revokedAt })
    if (revoked.length > 0) {
      await audit(tx, {
        actorId: by.id,
        workshopId: scene.workshopId,
        operation: 'link.revoke',
        subject: `link:${id}`,
        before: { revokedAt: null },
        after: { revokedAt: revoked[0].revokedAt },
      })
    }
    const row = await linkById(tx, id)
    if (!row) throw notFound('link')
    return shareLinkAnswer(row, new Date())
  })
}
