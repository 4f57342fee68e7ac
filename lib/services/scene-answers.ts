import type { SceneRow } from '@/db/queries/scenes'
import { versionOf, type VersionRow } from '@/db/queries/scene-versions'
import { sceneById } from '@/db/queries/scenes'
import type { Transaction } from '@/db/client'
import { operationsOf, roleIn, type Person } from '@/lib/auth/access'
import type { OpenedScene, SceneSummary, VersionAnswer, VersionSummary } from '@/lib/contracts/scenes'
import { notFound } from '@/lib/errors/problem'
import { storedScene } from './scene-document'
import { scenePattern } from './scene-pattern'

export const sceneSummary = (row: SceneRow): SceneSummary => ({
  id: row.id,
  workshopId: row.workshopId,
  title: row.title,
  archived: row.archivedAt !== null,
  headVersion: row.headVersion,
  cylinderCount: row.cylinderCount,
  displacementCc: row.displacementCc,
  ...scenePattern(row.id, row.headVersion, row.document),
  savedBy: row.savedBy,
  savedAt: row.savedAt.toISOString(),
  message: row.message,
  state: row.state,
  createdAt: row.createdAt.toISOString(),
  updatedAt: row.updatedAt.toISOString(),
  duplicatedFrom:
    row.duplicatedFrom !== null && row.duplicatedFromVersion !== null
      ? { sceneId: row.duplicatedFrom, version: row.duplicatedFromVersion }
      : null,
  thumbnailUrl: `/api/v1/scenes/${row.id}/thumbnail.png?version=${row.headVersion}`,
})

export const versionSummary = ({ document: _unread, createdAt, ...row }: VersionRow): VersionSummary => ({
  ...row,
  createdAt: createdAt.toISOString(),
})

export const versionAnswer = (row: VersionRow): VersionAnswer => ({
  ...versionSummary(row),
  document: storedScene(row.document),
})

/** A scene with one version, for somebody who may read it. */
export async function openedScene(
  tx: Transaction,
  person: Person,
  sceneId: string,
  number?: number,
): Promise<OpenedScene> {
  const scene = await sceneById(tx, sceneId)
  if (!scene) throw notFound('scene')
  const version = await versionOf(tx, sceneId, number ?? scene.headVersion)
  if (!version) throw notFound('version')
  const role = roleIn(person, scene.workshopId)
  return { scene: sceneSummary(scene), version: versionAnswer(version), may: role ? operationsOf(role) : [] }
}
