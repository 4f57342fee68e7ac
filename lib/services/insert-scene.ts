import type { Transaction } from '@/db/client'
import { scenes, sceneVersions } from '@/db/schema'
import { newId } from '@/db/schema/columns'
import type { Scene } from '@/scene/model/scene'
import { audit } from './audit'
import type { VersionPlace } from './idempotency'
import { drawLater } from './pictures/draw-later'
import { sceneFigures } from './scene-document'

interface NewScene {
  workshopId: string
  actorId: string
  title: string
  message: string
  document: Scene
  duplicatedFrom?: VersionPlace
}

/** A new scene with its version 1, whoever asks for it and why. */
export async function insertScene(tx: Transaction, wanted: NewScene): Promise<VersionPlace> {
  const { workshopId, actorId, title, message, document, duplicatedFrom } = wanted
  const id = newId()
  await tx.insert(scenes).values({
    id,
    workshopId,
    title,
    headVersion: 1,
    createdBy: actorId,
    duplicatedFrom: duplicatedFrom?.sceneId,
    duplicatedFromVersion: duplicatedFrom?.version,
  })
  await tx
    .insert(sceneVersions)
    .values({ sceneId: id, number: 1, message, authorId: actorId, document, ...sceneFigures(document) })
  await drawLater(tx, id, 1)
  await audit(tx, {
    actorId,
    workshopId,
    operation: duplicatedFrom ? 'scene.duplicate' : 'scene.create',
    subject: `scene:${id}`,
    after: { title, version: 1, message, ...(duplicatedFrom && { from: duplicatedFrom }) },
  })
  return { sceneId: id, version: 1 }
}
