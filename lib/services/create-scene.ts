import { write } from '@/db/client'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { once, requestHash, versionPlace } from './idempotency'
import { insertScene } from './insert-scene'
import { openedScene } from './scene-answers'
import { acceptScene } from './scene-document'
import { workshopOf } from './workshop-of'

interface NewScene {
  workshop?: string
  title?: string
  message: string
  document: unknown
}

export async function createScene(
  person: Person | null,
  wanted: NewScene,
  key?: string,
): Promise<OpenedScene> {
  const workshopId = person ? workshopOf(person, wanted.workshop) : ''
  authorise(person, 'scene.create', { workshopId }, 'workshop')
  const document = acceptScene(wanted.document)
  const title = wanted.title ?? (document.train.title.trim() || 'Untitled')
  const { message } = wanted
  return write(async (tx) => {
    const { sceneId, version } = await once(
      tx,
      person.id,
      key,
      requestHash('create', workshopId, wanted),
      versionPlace,
      () => insertScene(tx, { workshopId, actorId: person.id, title, message, document }),
    )
    return openedScene(tx, person, sceneId, version)
  })
}
