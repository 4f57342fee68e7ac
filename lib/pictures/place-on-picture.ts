import { fillViewProjection, project } from '@/scene/frame/camera'
import { fillPinned, ON_ENGINE_FRAME } from '@/scene/frame/pins'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { cameraOf } from '@/scene/frame/scene-camera'
import { isVectorId, type Anchor } from '@/scene/model/anchor'
import type { CrankTrain } from '@/scene/model/crank-train'
import { modelOf } from './model-of'

type Pinned = Pick<Anchor, 'partId' | 'pointMm' | 'angleDeg' | 'speedRpm' | 'camera'>

/**
 * Where a pinned point stands on a picture of its own view, in shares of width and height; null where it is not on it,
 * or the engine has no such part.
 */
export function placeOnPicture(
  document: CrankTrain,
  { partId, pointMm, angleDeg, speedRpm, camera }: Pinned,
  aspect: number,
): [number, number] | null {
  const { rig } = modelOf(document, speedRpm)
  const part = isVectorId(partId) ? ON_ENGINE_FRAME : rig.parts.findIndex(({ id }) => id === partId)
  if (part < 0 && !isVectorId(partId)) return null
  const pose = fillPose(buildPose(rig), rig, (angleDeg * Math.PI) / 180)
  const [x, y, z] = pointMm.map((mm) => mm / 1000)
  const world = fillPinned(new Float64Array(3), pose, part, x, y, z)
  const viewProjection = new Float64Array(16)
  fillViewProjection(viewProjection, new Float64Array(3), cameraOf(camera), aspect)
  const place = new Float64Array(3)
  if (!project(place, viewProjection, world[0], world[1], world[2], 1, 1)) return null
  const [across, down] = place
  return across >= 0 && across <= 1 && down >= 0 && down <= 1 ? [across, down] : null
}
