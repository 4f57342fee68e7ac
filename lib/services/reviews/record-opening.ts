import { sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import { sceneById } from '@/db/queries/scenes'
import { versionOpenings } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { notFound } from '@/lib/errors/problem'

/** Somebody has this version before them: the first time and the last are kept. */
export async function recordOpening(person: Person | null, sceneId: string, version: number): Promise<void> {
  await write(async (tx) => {
    authorise(person, 'review.read', await sceneById(tx, sceneId))
    if (!(await versionOf(tx, sceneId, version))) throw notFound('version')
    await tx
      .insert(versionOpenings)
      .values({ sceneId, version, userId: person.id })
      .onConflictDoUpdate({
        target: [versionOpenings.sceneId, versionOpenings.version, versionOpenings.userId],
        set: { lastAt: sql`now()` },
      })
  })
}
