import { and, eq, inArray } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { sceneVersions } from '@/db/schema'
import type { Scene } from '@/scene/model/scene'
import { storedScene } from '../scene-document'

// a version never changes: read once, it is known
const known = new Map<string, Scene>()
const mostKnown = 64

const keyOf = (sceneId: string, version: number) => `${sceneId} ${version}`

/** The documents of these versions of a scene; one that does not exist is left out. */
export async function versionsOf(
  tx: Transaction,
  sceneId: string,
  numbers: readonly number[],
): Promise<Map<number, Scene>> {
  const wanted = [...new Set(numbers)]
  const missing = wanted.filter((number) => !known.has(keyOf(sceneId, number)))
  const fresh = new Map<number, Scene>()
  if (missing.length > 0) {
    const rows = await tx
      .select({ number: sceneVersions.number, document: sceneVersions.document })
      .from(sceneVersions)
      .where(and(eq(sceneVersions.sceneId, sceneId), inArray(sceneVersions.number, missing)))
    for (const { number, document } of rows) fresh.set(number, storedScene(document))
  }
  const found = new Map<number, Scene>()
  for (const number of wanted) {
    const scene = fresh.get(number) ?? known.get(keyOf(sceneId, number))
    if (scene) found.set(number, scene)
  }
  for (const [number, scene] of found) keep(keyOf(sceneId, number), scene)
  return found
}

/** The latest used last, so that the first is the one to forget. */
function keep(key: string, scene: Scene) {
  known.delete(key)
  known.set(key, scene)
  if (known.size > mostKnown) known.delete(known.keys().next().value as string)
}
