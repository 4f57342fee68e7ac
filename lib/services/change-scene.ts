import { eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { lockScene, sceneById } from '@/db/queries/scenes'
import { scenes } from '@/db/schema'
import type { Operation, Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { SceneSummary } from '@/lib/contracts/scenes'
import { notFound } from '@/lib/errors/problem'
import { audit } from './audit'
import { sceneSummary } from './scene-answers'

type Changeable = Pick<typeof scenes.$inferSelect, 'title' | 'archivedAt'>

/** Changes what can change about a scene without a new version. A change to what already is leaves no trace. */
export async function changeScene(
  person: Person | null,
  id: string,
  operation: Operation,
  change: (scene: Changeable) => Partial<Changeable> | null,
): Promise<SceneSummary> {
  return write(async (tx) => {
    const scene = await lockScene(tx, id)
    authorise(person, operation, scene)
    const changed = change(scene)
    if (changed) {
      await tx.update(scenes).set(changed).where(eq(scenes.id, id))
      const { title, archivedAt } = scene
      await audit(tx, {
        actorId: person.id,
        workshopId: scene.workshopId,
        operation,
        subject: `scene:${id}`,
        before: { title, archivedAt },
        after: { title, archivedAt, ...changed },
      })
    }
    const row = await sceneById(tx, id)
    if (!row) throw notFound('scene')
    return sceneSummary(row)
  })
}
