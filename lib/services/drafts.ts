import { and, eq, isNull, sql } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { sceneDrafts } from '@/db/schema'
import type { Scene } from '@/scene/model/scene'

/** The one draft of a person for a scene, or for work that is no scene yet. */
export const thisDraft = (userId: string, sceneId: string | null) =>
  and(
    eq(sceneDrafts.userId, userId),
    sceneId === null ? isNull(sceneDrafts.sceneId) : eq(sceneDrafts.sceneId, sceneId),
  )

export async function upsertDraft(
  tx: Transaction,
  userId: string,
  sceneId: string | null,
  draft: { base: number | null; document: Scene },
): Promise<Date> {
  const kept = { baseVersion: draft.base, document: draft.document, updatedAt: sql`now()` }
  const [row] = await tx
    .insert(sceneDrafts)
    .values({ userId, sceneId, ...kept })
    .onConflictDoUpdate({ target: [sceneDrafts.userId, sceneDrafts.sceneId], set: kept })
    .returning({ updatedAt: sceneDrafts.updatedAt })
  return row.updatedAt
}

export const deleteDraft = (tx: Transaction, userId: string, sceneId: string | null) =>
  tx.delete(sceneDrafts).where(thisDraft(userId, sceneId))
