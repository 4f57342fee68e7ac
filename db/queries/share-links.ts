import { and, desc, eq, gt, isNull, or, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { scenes, sceneVersions, shareLinks, users, workshops } from '../schema'

const links = (tx: Transaction) =>
  tx
    .select({ link: shareLinks, createdBy: users.name })
    .from(shareLinks)
    .innerJoin(users, eq(users.id, shareLinks.createdBy))
    .$dynamic()

export type ShareLinkRow = Awaited<ReturnType<typeof links>>[number]

export const linksOfScene = (tx: Transaction, sceneId: string) =>
  links(tx).where(eq(shareLinks.sceneId, sceneId)).orderBy(desc(shareLinks.createdAt), desc(shareLinks.id))

export async function linkById(tx: Transaction, id: string): Promise<ShareLinkRow | undefined> {
  const [found] = await links(tx).where(eq(shareLinks.id, id))
  return found
}

/** Live: neither withdrawn nor past its end. What is not live is not told from what never was. */
export const liveLink = (tokenHash: string) =>
  and(
    eq(shareLinks.tokenHash, tokenHash),
    isNull(shareLinks.revokedAt),
    or(isNull(shareLinks.endsAt), gt(shareLinks.endsAt, sql`now()`)),
  )

/** What a live link opens. */
export async function sceneBehindLink(tx: Transaction, tokenHash: string) {
  const [found] = await tx
    .select({
      sceneId: scenes.id,
      title: scenes.title,
      workshop: workshops.name,
      endsAt: shareLinks.endsAt,
      version: sceneVersions.number,
      savedAt: sceneVersions.createdAt,
      document: sceneVersions.document,
    })
    .from(shareLinks)
    .innerJoin(scenes, eq(scenes.id, shareLinks.sceneId))
    .innerJoin(workshops, eq(workshops.id, scenes.workshopId))
    .innerJoin(
      sceneVersions,
      and(
        eq(sceneVersions.sceneId, scenes.id),
        eq(sceneVersions.number, sql`coalesce(${shareLinks.version}, ${scenes.headVersion})`),
      ),
    )
    .where(liveLink(tokenHash))
  return found
}
