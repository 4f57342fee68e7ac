import { sql } from 'drizzle-orm'
import { read, write, type Transaction } from '@/db/client'
import { liveLink, sceneBehindLink } from '@/db/queries/share-links'
import { shareLinks } from '@/db/schema'
import { hashToken } from '@/lib/auth/tokens'
import type { SharedScene } from '@/lib/contracts/share-links'
import { linkUnavailable } from '@/lib/errors/problem'
import { storedScene } from './scene-document'

/** What a live link opens, without counting it: for pictures of it. */
export const lookThroughShareLink = (token: string) => read((tx) => behind(tx, hashToken(token)))

/** What a live link opens, counted as an opening. Unknown, ended and withdrawn ones are refused alike. */
export async function openShareLink(token: string): Promise<SharedScene> {
  const tokenHash = hashToken(token)
  const { sceneId: _, ...shared } = await write(async (tx) => {
    await tx
      .update(shareLinks)
      .set({ opened: sql`${shareLinks.opened} + 1`, lastOpenedAt: sql`now()` })
      .where(liveLink(tokenHash))
    return behind(tx, tokenHash)
  })
  return shared
}

async function behind(tx: Transaction, tokenHash: string): Promise<SharedScene & { sceneId: string }> {
  const found = await sceneBehindLink(tx, tokenHash)
  if (!found) throw linkUnavailable()
  return {
    ...found,
    savedAt: found.savedAt.toISOString(),
    endsAt: found.endsAt?.toISOString() ?? null,
    document: storedScene(found.document),
  }
}
