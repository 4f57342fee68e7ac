import type { Train } from '@/lib/mechanics/train'
import { buildRig } from '@/scene/frame/build-rig'
import { cameraOf } from '@/scene/frame/scene-camera'
import type { Rig } from '@/scene/frame/types'
import type { Scene } from '@/scene/model/scene'
import { createClock, type Clock } from '@/scene/session/clock'
import { createStage } from '@/scene/stage/create-stage'
import type { Stage } from '@/scene/stage/types'

const radians = Math.PI / 180
const rpm = (2 * Math.PI) / 60

/** A scene that is seen to move; its forces and its drive may come later. */
export interface MovingScene {
  stage: Stage
  clock: Clock
  rig: Rig
}

/** A clock that stands where the scene was saved, and runs as it ran, unless motion is not wanted. */
function clockOf(view: Scene['view'], cycle: number, still: boolean): Clock {
  const clock = createClock(cycle)
  clock.setAngle(view.angleDeg * radians)
  clock.setRate((view.speedRpm * rpm) / view.slowdown)
  clock.setReverse(view.reverse)
  if (view.playing && !still) clock.play()
  return clock
}

/** Sets a scene moving in `host` with as little as that takes; `onSeen` is told once its pictures are there. */
export async function startScene(
  host: HTMLElement,
  { train: document, view }: Scene,
  train: Train,
  onSeen: () => void,
): Promise<MovingScene> {
  const whole = buildRig(document, train)
  const rig =
    view.sectionAxialMm === null
      ? whole
      : (await import('@/scene/stage/cut-rig')).cutRig(whole, view.sectionAxialMm / 1000)
  const still = window.matchMedia('(prefers-reduced-motion: reduce)').matches
  const clock = clockOf(view, train.cycle, still)
  const stage = createStage(host, clock, { onSeen }, { renderer: 'auto', motion: !still })
  stage.setModel({ rig })
  stage.setLook({
    hidden: view.hidden,
    ghost: view.ghost,
    overlays: view.overlays,
    lit: [],
    balloons: [],
    forceUnit: 'N',
  })
  stage.setCamera(view.camera && cameraOf(view.camera))
  return { stage, clock, rig }
}
