import { z } from 'zod'
import { arrivingDocument } from './documents'

/** What is drawn or printed: a scene as it is looked at, or a crank train with a speed and an angle. */
export const printedFields = {
  scene: arrivingDocument('SceneInput').optional(),
  /** Instead of a scene. */
  train: arrivingDocument('CrankTrainInput').optional(),
  /** Default: those of the scene, or the rated speed at 0°. */
  speedRpm: z.number().nonnegative().max(100_000).optional(),
  angleDeg: z.number().min(-36_000).max(36_000).optional(),
}
