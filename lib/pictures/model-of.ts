import type { CrankTrain } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import { buildStageModel } from '@/scene/stage/build-stage-model'
import type { StageModel } from '@/scene/stage/types'

const rpm = Math.PI / 30

const models = new WeakMap<CrankTrain, { speedRpm: number; model: StageModel }>()

/** An engine on the stage at a speed; the pictures of one document in a row share it. */
export function modelOf(document: CrankTrain, speedRpm: number): StageModel {
  const known = models.get(document)
  if (known?.speedRpm === speedRpm) return known.model
  const model = buildStageModel(document, toTrain(document), speedRpm * rpm)
  models.set(document, { speedRpm, model })
  return model
}
