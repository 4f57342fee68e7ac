import { read } from '@/db/client'
import { pageOfVersions } from '@/db/queries/scene-versions'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { VersionSummary } from '@/lib/contracts/scenes'

export async function listVersions(
  person: Person | null,
  id: string,
  page: { before?: number; limit: number },
): Promise<{ versions: VersionSummary[]; next: number | null }> {
  return read(async (tx) => {
    authorise(person, 'scene.read', await sceneById(tx, id))
    const { versions, next } = await pageOfVersions(tx, id, page.before, page.limit)
    return { versions: versions.map((row) => ({ ...row, createdAt: row.createdAt.toISOString() })), next }
  })
}
