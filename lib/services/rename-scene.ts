import type { Person } from '@/lib/auth/access'
import { changeScene } from './change-scene'

export const renameScene = (person: Person | null, id: string, title: string) =>
  changeScene(person, id, 'scene.rename', (scene) => (scene.title === title ? null : { title }))
