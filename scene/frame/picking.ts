import type { Camera, Pose, Rig, Visibility } from './types'
import { GHOST, HIDDEN } from './types'
import { eyeDirection } from './view-direction'

/** A line of sight in the world, and what it met. Made once and filled again. */
export interface Ray {
  origin: Float64Array
  /** Of unit length. */
  direction: Float64Array
  /** Nothing nearer than this is met, m. */
  near: number
  /** Where the last pick met its part. */
  hit: Float64Array
  distance: number
}

export const buildRay = (): Ray => ({
  origin: new Float64Array(3),
  direction: new Float64Array(3),
  near: 0,
  hit: new Float64Array(3),
  distance: Infinity,
})

/** The line of sight through a point of the sheet, given from its middle: x from −1 to 1 rightwards, y upwards. */
export function fillRay(ray: Ray, camera: Camera, aspect: number, x: number, y: number): Ray {
  const { yaw, pitch, distance, target } = camera
  const tangent = Math.tan(camera.fov / 2)
  const across = x * tangent * aspect
  const up = y * tangent
  const towards = eyeDirection(yaw, pitch)
  const dx = -towards[0] - Math.cos(yaw) * across - Math.sin(yaw) * Math.sin(pitch) * up
  const dy = -towards[1] + Math.cos(pitch) * up
  const dz = -towards[2] - Math.sin(yaw) * across + Math.cos(yaw) * Math.sin(pitch) * up
  const length = Math.hypot(dx, dy, dz)
  for (let k = 0; k < 3; k++) ray.origin[k] = target[k] + towards[k] * distance
  ray.direction[0] = dx / length
  ray.direction[1] = dy / length
  ray.direction[2] = dz / length
  ray.near = distance / 100
  return ray
}

/** The ray in the coordinates of the part in hand: its origin and direction. */
const local = new Float64Array(6)

/**
 * The nearest shown part on the ray, or −1: boxes first, then the triangles that face the eye. What is hidden or only
 * outlined lets the ray through.
 */
export function pickPart(rig: Rig, pose: Pose, visibility: Visibility, ray: Ray): number {
  let found = -1
  ray.distance = Infinity
  for (let part = 0; part < rig.parts.length; part++) {
    if (visibility[part] === HIDDEN || visibility[part] === GHOST) continue
    const mesh = rig.meshes[rig.parts[part].mesh]
    if (mesh.triangles.length === 0) continue
    intoPart(pose, part, ray)
    if (!meetsBox(mesh.box, ray.near, ray.distance)) continue
    const distance = nearestFace(mesh.positions, mesh.triangles, ray.near, ray.distance)
    if (distance >= ray.distance) continue
    ray.distance = distance
    found = part
  }
  if (found >= 0) for (let k = 0; k < 3; k++) ray.hit[k] = ray.origin[k] + ray.distance * ray.direction[k]
  return found
}

function intoPart(pose: Pose, part: number, { origin, direction }: Ray) {
  const cos = pose[4 * part]
  const sin = pose[4 * part + 1]
  const x = origin[0] - pose[4 * part + 2]
  const y = origin[1] - pose[4 * part + 3]
  local[0] = cos * x + sin * y
  local[1] = cos * y - sin * x
  local[2] = origin[2]
  local[3] = cos * direction[0] + sin * direction[1]
  local[4] = cos * direction[1] - sin * direction[0]
  local[5] = direction[2]
}

function meetsBox(box: Float32Array, near: number, far: number): boolean {
  let enter = near
  let exit = far
  for (let k = 0; k < 3; k++) {
    const from = local[k]
    const along = local[3 + k]
    if (along === 0) {
      if (from < box[k] || from > box[k + 3]) return false
      continue
    }
    const one = (box[k] - from) / along
    const other = (box[k + 3] - from) / along
    enter = Math.max(enter, Math.min(one, other))
    exit = Math.min(exit, Math.max(one, other))
  }
  return enter <= exit
}

/** Distance to the nearest face met from its outside, or `far` (Möller and Trumbore's test). */
function nearestFace(positions: Float32Array, triangles: Uint32Array, near: number, far: number): number {
  let nearest = far
  for (let i = 0; i < triangles.length; i += 3) {
    const a = 3 * triangles[i]
    const b = 3 * triangles[i + 1]
    const c = 3 * triangles[i + 2]
    const ax = positions[a]
    const ay = positions[a + 1]
    const az = positions[a + 2]
    const ux = positions[b] - ax
    const uy = positions[b + 1] - ay
    const uz = positions[b + 2] - az
    const vx = positions[c] - ax
    const vy = positions[c + 1] - ay
    const vz = positions[c + 2] - az
    const px = local[4] * vz - local[5] * vy
    const py = local[5] * vx - local[3] * vz
    const pz = local[3] * vy - local[4] * vx
    const determinant = ux * px + uy * py + uz * pz
    if (determinant <= 0) continue
    const tx = local[0] - ax
    const ty = local[1] - ay
    const tz = local[2] - az
    const alongU = tx * px + ty * py + tz * pz
    if (alongU < 0 || alongU > determinant) continue
    const qx = ty * uz - tz * uy
    const qy = tz * ux - tx * uz
    const qz = tx * uy - ty * ux
    const alongV = local[3] * qx + local[4] * qy + local[5] * qz
    if (alongV < 0 || alongU + alongV > determinant) continue
    const distance = (vx * qx + vy * qy + vz * qz) / determinant
    if (distance >= near && distance < nearest) nearest = distance
  }
  return nearest
}
