import { write } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { notFound } from '@/lib/errors/problem'
import { once, requestHash, versionPlace } from './idempotency'
import { insertScene } from './insert-scene'
import { openedScene } from './scene-answers'
import { storedScene } from './scene-document'

/** A new scene that begins with one version of another and remembers which. */
export async function duplicateScene(
  person: Person | null,
  id: string,
  wanted: { title?: string; version?: number },
  key?: string,
): Promise<OpenedScene> {
  return write(async (tx) => {
    const scene = await sceneById(tx, id)
    authorise(person, 'scene.duplicate', scene)
    if (!scene) throw notFound('scene')
    const from = await versionOf(tx, id, wanted.version ?? scene.headVersion)
    if (!from) throw notFound('version')
    const place = await once(tx, person.id, key, requestHash('duplicate', id, wanted), versionPlace, () =>
      insertScene(tx, {
        workshopId: scene.workshopId,
        actorId: person.id,
        title: wanted.title ?? `Copy of ${scene.title}`.slice(0, 200),
        message: `From version ${from.number} of ${scene.title}`,
        document: storedScene(from.document),
        duplicatedFrom: { sceneId: id, version: from.number },
      }),
    )
    return openedScene(tx, person, place.sceneId, place.version)
  })
}
