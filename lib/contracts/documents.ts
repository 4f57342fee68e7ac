import { z } from 'zod'
import { crankTrainSchema } from '@/scene/model/crank-train'
import { sceneSchema } from '@/scene/model/scene'

/**
 * Documents as they may arrive. A request only names them: they are read by the readers of scene/model, which say
 * more about what is wrong than a schema can.
 */
export const arriving = { CrankTrainInput: crankTrainSchema, SceneInput: sceneSchema }

export const arrivingDocument = (name: keyof typeof arriving) =>
  z.unknown().meta({ override: { $ref: `#/components/schemas/${name}` } })

/** A scene document as it is answered: every default filled in. */
export const sceneDocument = sceneSchema.meta({ id: 'Scene' })
