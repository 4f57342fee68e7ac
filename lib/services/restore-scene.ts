import type { Person } from '@/lib/auth/access'
import { changeScene } from './change-scene'

export const restoreScene = (person: Person | null, id: string) =>
  changeScene(person, id, 'scene.restore', (scene) => (scene.archivedAt ? { archivedAt: null } : null))
