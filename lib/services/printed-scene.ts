import { refused } from '@/lib/errors/problem'
import { newScene } from '@/scene/model/default-scene'
import { readScene } from '@/scene/model/read-scene'
import { readTrain } from '@/scene/model/read-train'
import type { Scene } from '@/scene/model/scene'
import { under } from './scene-document'

interface Printed {
  scene?: unknown
  train?: unknown
  speedRpm?: number
  angleDeg?: number
}

/** The scene that a request is about, at the speed and angle it asks for. */
export function printedScene({ scene, train, speedRpm, angleDeg }: Printed): Scene {
  if ((scene === undefined) === (train === undefined))
    throw refused([
      {
        path: 'scene',
        code: scene === undefined ? 'missing' : 'twice',
        message:
          scene === undefined
            ? 'There is neither a scene nor a crank train.'
            : 'There are a scene and a crank train.',
        fix: 'Give `scene` or `train`, one of them.',
      },
    ])
  const found = scene === undefined ? sceneAround(train) : readAsked(scene)
  const view = {
    ...found.view,
    speedRpm: speedRpm ?? found.view.speedRpm,
    angleDeg: angleDeg ?? found.view.angleDeg,
  }
  return { ...found, view }
}

function readAsked(json: unknown): Scene {
  const read = readScene(json)
  if (!read.ok) throw refused(under('scene', read.issues))
  return read.scene
}

function sceneAround(json: unknown): Scene {
  const read = readTrain(json)
  if (!read.ok) throw refused(under('train', read.issues))
  return newScene(read.document)
}
