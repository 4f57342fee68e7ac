import { useEffect, useMemo, useState } from 'react'
import type { Train } from '@/lib/mechanics/train'
import type { System } from '@/lib/units/quantities'
import type { Scene, SceneView } from '@/scene/model/scene'
import { toTrain } from '@/scene/model/to-train'
import { createClock, type Clock } from '@/scene/session/clock'
import { buildStageModel } from '@/scene/stage/build-stage-model'
import type { StageModel } from '@/scene/stage/types'
import { radians } from './clock-moves'
import { useReducedMotion } from './use-reduced-motion'

const rpm = (2 * Math.PI) / 60

/** What a drawing shows beside the engine: it can be put aside and taken up again. */
export interface Shown extends Pick<SceneView, 'hidden' | 'ghost' | 'overlays' | 'sectionAxialMm'> {
  system: System
}

/** A stored scene, ready to be drawn: read only, with a clock of its own that stands where the scene was saved. */
export interface Drawing {
  scene: Scene
  train: Train
  model: StageModel
  clock: Clock
  still: boolean
  shown: Shown
  setShown(shown: Shown): void
}

export function useDrawing(scene: Scene): Drawing {
  const { view } = scene
  const still = useReducedMotion()
  const train = useMemo(() => toTrain(scene.train), [scene])
  const model = useMemo(() => buildStageModel(scene.train, train, view.speedRpm * rpm), [scene, train, view])
  const [clock] = useState(() => createClock(train.cycle))
  const [shown, setShown] = useState<Shown>({
    hidden: view.hidden,
    ghost: view.ghost,
    overlays: view.overlays,
    sectionAxialMm: view.sectionAxialMm,
    system: 'si',
  })
  useEffect(() => {
    clock.setCycle(train.cycle)
    clock.setAngle(radians(view.angleDeg))
    clock.setRate((view.speedRpm * rpm) / view.slowdown)
    clock.setReverse(view.reverse)
    return () => clock.pause()
  }, [clock, train, view])
  return { scene, train, model, clock, still, shown, setShown }
}
