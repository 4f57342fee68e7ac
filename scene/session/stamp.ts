import { method } from '@/lib/mechanics/method'
import { sameTrain } from './same-train'
import type { SessionState } from './session'

/** What every file of this bench says about where its figures come from. */
export function stampOf({ scene, saved }: SessionState, at: Date): Record<string, string> {
  const changed = saved !== null && !sameTrain(saved.scene.train, scene.train)
  return {
    title: scene.train.title,
    scene: saved?.sceneId ?? 'not saved',
    version: saved ? `${saved.version}${changed ? ', with changes' : ''}` : 'none',
    speed: `${scene.view.speedRpm} rpm`,
    written: at.toISOString(),
    method: `${method.name}, ${method.version}`,
  }
}
