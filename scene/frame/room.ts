import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'
import type { CrankLayout } from './crank-layout'
import type { RigParts } from './rig-parts'
import type { Shape } from './shape'

/** What every builder of parts works in: the engine described, its sizes, and where its parts are gathered. */
export interface Room {
  parts: RigParts
  document: CrankTrain
  train: Train
  shape: Shape
  layout: CrankLayout
  mirror: -1 | 1
}
