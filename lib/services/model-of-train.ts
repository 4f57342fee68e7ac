import type { modelOf as contract } from '@/lib/contracts/models'
import type { BodyOf } from '@/lib/contracts/operation'
import type { ModelColours } from '@/lib/export/model-document'
import { modelFile } from '@/lib/export/model-file'
import { method } from '@/lib/mechanics/method'
import { buildRig } from '@/scene/frame/build-rig'
import { toTrain } from '@/scene/model/to-train'
import { printedScene } from './printed-scene'

/** The parts of what was sent, at the angle it is shown at, as a model file. */
export function modelOfTrain(
  body: BodyOf<typeof contract>,
  colours: ModelColours,
): Promise<Uint8Array<ArrayBuffer>> {
  const { train: document, view } = printedScene(body)
  return modelFile(
    {
      rig: buildRig(document, toTrain(document)),
      angle: (view.angleDeg * Math.PI) / 180,
      title: document.title,
      colours,
      hidden: view.hidden,
      stamp: {
        speedRpm: view.speedRpm,
        rotation: document.rotation,
        method: `${method.name}, version ${method.version}`,
      },
    },
    body.form,
  )
}
