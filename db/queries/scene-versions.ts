import { and, desc, eq, lt } from 'drizzle-orm'
import type { Transaction } from '../client'
import { sceneVersions, users, versionStates } from '../schema'
import { itsState, stateOfVersion } from './version-state'

const summary = {
  number: sceneVersions.number,
  parent: sceneVersions.parent,
  message: sceneVersions.message,
  state: stateOfVersion,
  author: users.name,
  createdAt: sceneVersions.createdAt,
}

export async function versionOf(tx: Transaction, sceneId: string, number: number) {
  const [version] = await tx
    .select({ ...summary, document: sceneVersions.document })
    .from(sceneVersions)
    .innerJoin(users, eq(users.id, sceneVersions.authorId))
    .leftJoin(versionStates, itsState)
    .where(and(eq(sceneVersions.sceneId, sceneId), eq(sceneVersions.number, number)))
  return version
}
export type VersionRow = NonNullable<Awaited<ReturnType<typeof versionOf>>>

/** Newest first; `before` is the number where the last page ended. */
export async function pageOfVersions(
  tx: Transaction,
  sceneId: string,
  before: number | undefined,
  limit: number,
) {
  const rows = await tx
    .select(summary)
    .from(sceneVersions)
    .innerJoin(users, eq(users.id, sceneVersions.authorId))
    .leftJoin(versionStates, itsState)
    .where(
      and(
        eq(sceneVersions.sceneId, sceneId),
        before === undefined ? undefined : lt(sceneVersions.number, before),
      ),
    )
    .orderBy(desc(sceneVersions.number))
    .limit(limit + 1)
  const shown = rows.slice(0, limit)
  return { versions: shown, next: rows.length > limit ? (shown.at(-1)?.number ?? null) : null }
}
