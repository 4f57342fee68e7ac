import { and, desc, eq, lt, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import { linkOpenings, linkQuestions, scenes, shareLinks, workshops } from '../schema'

interface Page {
  before?: string
  limit: number
}

const pageOf = <Row extends { id: string }>(rows: Row[], limit: number) => ({
  rows: rows.slice(0, limit),
  next: rows.length > limit ? rows[limit - 1].id : null,
})

export async function pageOfOpenings(tx: Transaction, linkId: string, { before, limit }: Page) {
  const bound = tx
    .select({ at: linkOpenings.openedAt, id: linkOpenings.id })
    .from(linkOpenings)
    .where(eq(linkOpenings.id, before ?? linkId))
  const rows = await tx
    .select()
    .from(linkOpenings)
    .where(
      and(
        eq(linkOpenings.linkId, linkId),
        before === undefined ? undefined : sql`(${linkOpenings.openedAt}, ${linkOpenings.id}) < (${bound})`,
      ),
    )
    .orderBy(desc(linkOpenings.openedAt), desc(linkOpenings.id))
    .limit(limit + 1)
  return pageOf(rows, limit)
}

export async function pageOfQuestions(tx: Transaction, linkId: string, { before, limit }: Page) {
  const rows = await tx
    .select()
    .from(linkQuestions)
    // ids grow with time
    .where(
      and(eq(linkQuestions.linkId, linkId), before === undefined ? undefined : lt(linkQuestions.id, before)),
    )
    .orderBy(desc(linkQuestions.id))
    .limit(limit + 1)
  return pageOf(rows, limit)
}

export const keptDaysOf = (tx: Transaction, linkId: string) =>
  tx
    .select({ days: workshops.openingsKeptDays })
    .from(shareLinks)
    .innerJoin(scenes, eq(scenes.id, shareLinks.sceneId))
    .innerJoin(workshops, eq(workshops.id, scenes.workshopId))
    .where(eq(shareLinks.id, linkId))
    .then(([found]) => found.days)

/** How many questions this address has put to any link since then. */
export const questionsFrom = (tx: Transaction, email: string, since: Date) =>
  tx.$count(
    linkQuestions,
    and(eq(linkQuestions.email, email), sql`${linkQuestions.createdAt} > ${since.toISOString()}`),
  )

/** Of each workshop what is older than it keeps; how many there were. */
export async function dropOldOpenings(tx: Transaction, now: Date): Promise<number> {
  const dropped = await tx.execute(sql`
    delete from ${linkOpenings} using ${shareLinks}, ${scenes}, ${workshops}
    where ${shareLinks.id} = ${linkOpenings.linkId} and ${scenes.id} = ${shareLinks.sceneId}
      and ${workshops.id} = ${scenes.workshopId}
      and ${linkOpenings.openedAt} < ${now.toISOString()}::timestamptz - make_interval(days => ${workshops.openingsKeptDays})`)
  return dropped.count
}
