import type { Person } from '@/lib/auth/access'
import { changeScene } from './change-scene'

/** Puts a scene away: out of the list, with its versions and links as they are. */
export const archiveScene = (person: Person | null, id: string) =>
  changeScene(person, id, 'scene.archive', (scene) => (scene.archivedAt ? null : { archivedAt: new Date() }))
