import { and, desc, eq, gt, isNull, or, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { linkQuestions, scenes, shareLinks, users, workshops } from '../schema'

const links = (tx: Transaction) =>
  tx
    .select({
      link: shareLinks,
      createdBy: users.name,
      questions: tx.$count(linkQuestions, eq(linkQuestions.linkId, shareLinks.id)),
    })
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

/** The sites that may show a live link in a frame; none for one that is not live. */
export async function framesOf(tx: Transaction, tokenHash: string): Promise<string[]> {
  const [found] = await tx
    .select({ origins: shareLinks.frameOrigins })
    .from(shareLinks)
    .where(liveLink(tokenHash))
  return found?.origins ?? []
}

/** A live link and where it leads: the version that it shows of its scene. */
export async function liveLinkBy(tx: Transaction, tokenHash: string) {
  const [found] = await tx
    .select({
      id: shareLinks.id,
      kind: shareLinks.kind,
      passwordHash: shareLinks.passwordHash,
      frameOrigins: shareLinks.frameOrigins,
      endsAt: shareLinks.endsAt,
      pinned: shareLinks.version,
      sceneId: scenes.id,
      title: scenes.title,
      headVersion: scenes.headVersion,
      workshopId: workshops.id,
      workshop: workshops.name,
      openingsKeptDays: workshops.openingsKeptDays,
    })
    .from(shareLinks)
    .innerJoin(scenes, eq(scenes.id, shareLinks.sceneId))
    .innerJoin(workshops, eq(workshops.id, scenes.workshopId))
    .where(liveLink(tokenHash))
  return found
}
export type LiveLink = NonNullable<Awaited<ReturnType<typeof liveLinkBy>>>
