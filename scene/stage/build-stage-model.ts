import type { Train } from '@/lib/mechanics/train'
import { buildRig } from '@/scene/frame/build-rig'
import type { Rig } from '@/scene/frame/types'
import type { CrankTrain } from '@/scene/model/crank-train'
import { buildForces } from './build-forces'
import type { StageModel } from './types'

/** A train on the stage at one speed, rad/s: pure, so whoever holds it may memoise by identity. */
export const buildStageModel = (document: CrankTrain, train: Train, speed: number): StageModel => ({
  rig: rigOf(document, train),
  ...buildForces(train, speed),
})

/** The parts do not know the speed: another speed of the same train has the same rig. */
const rigs = new WeakMap<Train, { document: CrankTrain; rig: Rig }>()

function rigOf(document: CrankTrain, train: Train): Rig {
  const kept = rigs.get(train)
  if (kept?.document === document) return kept.rig
  const rig = buildRig(document, train)
  rigs.set(train, { document, rig })
  return rig
}
