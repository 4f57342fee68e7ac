import { sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { liveLink } from '@/db/queries/share-links'
import { shareLinks } from '@/db/schema'
import { hashToken } from '@/lib/auth/tokens'
import { linkUnavailable } from '@/lib/errors/problem'

/** Counts that somebody has a link's page before them: whatever only fetches it, as mail scanners do, is not counted. */
export async function countOpening(token: string): Promise<void> {
  const counted = await write((tx) =>
    tx
      .update(shareLinks)
      .set({ opened: sql`${shareLinks.opened} + 1`, lastOpenedAt: sql`now()` })
      .where(liveLink(hashToken(token)))
      .returning({ id: shareLinks.id }),
  )
  if (counted.length === 0) throw linkUnavailable()
}
