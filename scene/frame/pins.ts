import type { Camera, Pose, Rig, Visibility } from './types'
import { pickPart, type Ray } from './picking'

/** The part index of what is pinned to the engine as a whole: it does not move. */
export const ON_ENGINE_FRAME = -1

/** Where a point of a part stands in the world, m. Allocates nothing. */
export function fillPinned(
  out: Float64Array,
  pose: Pose,
  part: number,
  x: number,
  y: number,
  z: number,
): Float64Array {
  const still = part === ON_ENGINE_FRAME
  const cos = still ? 1 : pose[4 * part]
  const sin = still ? 0 : pose[4 * part + 1]
  out[0] = cos * x - sin * y + (still ? 0 : pose[4 * part + 2])
  out[1] = sin * x + cos * y + (still ? 0 : pose[4 * part + 3])
  out[2] = z
  return out
}

/** A point of the world in the coordinates of a part, m: where a pin on it goes. */
export function pointOnPart(pose: Pose, part: number, world: ArrayLike<number>): [number, number, number] {
  if (part === ON_ENGINE_FRAME) return [world[0], world[1], world[2]]
  const cos = pose[4 * part]
  const sin = pose[4 * part + 1]
  const x = world[0] - pose[4 * part + 2]
  const y = world[1] - pose[4 * part + 3]
  return [cos * x + sin * y, cos * y - sin * x, world[2]]
}

/** The middle of a part in its own coordinates, m: where a pin goes that no hand has placed. */
export function middleOfPart(rig: Rig, part: number): [number, number, number] {
  const { box } = rig.meshes[rig.parts[part].mesh]
  return [(box[0] + box[3]) / 2, (box[1] + box[4]) / 2, (box[2] + box[5]) / 2]
}

/** How much nearer another part must be to stand before a point, m: the point itself lies on a surface. */
const tolerance = 0.001

/** Does another part stand between the eye and a point of this one? */
export function standsBehind(
  ray: Ray,
  rig: Rig,
  pose: Pose,
  visibility: Visibility,
  camera: Pick<Camera, 'distance'>,
  eye: ArrayLike<number>,
  point: ArrayLike<number>,
  part: number,
): boolean {
  const x = point[0] - eye[0]
  const y = point[1] - eye[1]
  const z = point[2] - eye[2]
  const length = Math.sqrt(x * x + y * y + z * z)
  for (let k = 0; k < 3; k++) ray.origin[k] = eye[k]
  ray.direction[0] = x / length
  ray.direction[1] = y / length
  ray.direction[2] = z / length
  ray.near = camera.distance / 100
  const met = pickPart(rig, pose, visibility, ray)
  return met >= 0 && met !== part && ray.distance < length - tolerance
}
