import { read } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { openedScene } from './scene-answers'

/** A scene with the version asked for, or its head. */
export async function openScene(person: Person | null, id: string, version?: number): Promise<OpenedScene> {
  return read(async (tx) => {
    authorise(person, 'scene.read', await sceneById(tx, id))
    return openedScene(tx, person, id, version)
  })
}
