import { cornersOf } from './extent'
import type { NamedView } from './named-views'
import type { Camera, Rig } from './types'
import { defaultPitch, defaultYaw } from './view-direction'

/** Full vertical angle of the lens; LOOK allows no stronger perspective than 20°. */
const FOV = (16 * Math.PI) / 180
/** Share of the sheet that a framed engine may fill. */
const FILL = 0.92

export interface ViewDirection {
  yaw: number
  pitch: number
}

/** The camera's own axes in the world: to the right, up, and towards the eye. All written into one array of nine. */
export function fillAxes(out: Float64Array | number[], { yaw, pitch }: ViewDirection) {
  const cosYaw = Math.cos(yaw)
  const sinYaw = Math.sin(yaw)
  const cosPitch = Math.cos(pitch)
  const sinPitch = Math.sin(pitch)
  out[0] = -cosYaw
  out[1] = 0
  out[2] = -sinYaw
  out[3] = -sinYaw * sinPitch
  out[4] = cosPitch
  out[5] = cosYaw * sinPitch
  out[6] = sinYaw * cosPitch
  out[7] = sinPitch
  out[8] = -cosYaw * cosPitch
}

const axes = new Float64Array(9)

/** World → clip, column-major, and the eye in world coordinates. */
export function fillViewProjection(out: Float64Array, eye: Float64Array, camera: Camera, aspect: number) {
  fillAxes(axes, camera)
  for (let k = 0; k < 3; k++) eye[k] = camera.target[k] + axes[6 + k] * camera.distance
  const near = camera.distance / 100
  const far = camera.distance * 20
  const scale = 1 / Math.tan(camera.fov / 2)
  const depth = (far + near) / (near - far)
  const shift = (2 * far * near) / (near - far)
  let right = 0
  let up = 0
  let back = 0
  for (let k = 0; k < 3; k++) {
    out[4 * k] = (scale / aspect) * axes[k]
    out[4 * k + 1] = scale * axes[3 + k]
    out[4 * k + 2] = depth * axes[6 + k]
    out[4 * k + 3] = -axes[6 + k]
    right -= axes[k] * eye[k]
    up -= axes[3 + k] * eye[k]
    back -= axes[6 + k] * eye[k]
  }
  out[12] = (scale / aspect) * right
  out[13] = scale * up
  out[14] = depth * back + shift
  out[15] = -back
}

/**
 * A point of the world on a sheet of this size: x to the right, y down, and its depth along the view, m.
 * False behind the eye.
 */
export function project(
  out: Float64Array,
  viewProjection: Float64Array,
  x: number,
  y: number,
  z: number,
  width: number,
  height: number,
): boolean {
  const m = viewProjection
  const w = m[3] * x + m[7] * y + m[11] * z + m[15]
  if (w <= 0) return false
  out[0] = (((m[0] * x + m[4] * y + m[8] * z + m[12]) / w + 1) / 2) * width
  out[1] = ((1 - (m[1] * x + m[5] * y + m[9] * z + m[13]) / w) / 2) * height
  out[2] = w
  return true
}

/** The nearest camera in this direction that has the whole box on the sheet. */
export const frameCamera = (bounds: ArrayLike<number>, aspect: number, direction: ViewDirection): Camera =>
  framePoints(cornersOf(bounds), aspect, direction)

/** A named view with the whole engine on the sheet, at whatever angle the crank stands. */
export const namedCamera = (name: NamedView, rig: Rig, aspect: number): Camera =>
  framePoints(rig.extent, aspect, directionOf(name, rig))

/**
 * The nearest camera that has all points on the sheet. Every point bounds the eye by the four planes of the lens, so the
 * target lies half-way between the extremes and the distance is the greater of the two that they ask for.
 */
function framePoints(points: ArrayLike<number>, aspect: number, { yaw, pitch }: ViewDirection): Camera {
  fillAxes(axes, { yaw, pitch })
  const tangent = [Math.tan(FOV / 2) * aspect * FILL, Math.tan(FOV / 2) * FILL]
  const most = [-Infinity, -Infinity]
  const least = [Infinity, Infinity]
  let nearest = -Infinity
  let farthest = Infinity
  for (let i = 0; i < points.length; i += 3) {
    const along = (axis: number) =>
      axes[3 * axis] * points[i] + axes[3 * axis + 1] * points[i + 1] + axes[3 * axis + 2] * points[i + 2]
    const depth = along(2)
    nearest = Math.max(nearest, depth)
    farthest = Math.min(farthest, depth)
    for (let axis = 0; axis < 2; axis++) {
      most[axis] = Math.max(most[axis], along(axis) + depth * tangent[axis])
      least[axis] = Math.min(least[axis], along(axis) - depth * tangent[axis])
    }
  }
  const eye = Math.max(...[0, 1].map((axis) => (most[axis] - least[axis]) / (2 * tangent[axis])))
  const middle = [(most[0] + least[0]) / 2, (most[1] + least[1]) / 2, (nearest + farthest) / 2]
  const target = [0, 1, 2].map((k) => axes[k] * middle[0] + axes[3 + k] * middle[1] + axes[6 + k] * middle[2])
  return { yaw, pitch, target: target as [number, number, number], distance: eye - middle[2], fov: FOV }
}

/** Where each named view looks from; side, bank and top have the free end on the left. */
export function directionOf(name: NamedView, rig: Rig): ViewDirection {
  if (name === 'end') return { yaw: 0, pitch: 0 }
  if (name === 'drive') return { yaw: Math.PI, pitch: 0 }
  if (name === 'side') return { yaw: -Math.PI / 2, pitch: 0 }
  if (name === 'top') return { yaw: -Math.PI / 2, pitch: Math.PI / 2 }
  if (name === 'bank') return { yaw: -Math.PI / 2, pitch: bankPitch(rig) }
  return { yaw: defaultYaw, pitch: defaultPitch }
}

/** Square to the bores of the bank that leans most to the viewer's side, so that its strokes are seen in true length. */
function bankPitch(rig: Rig): number {
  const leans = rig.anchors.firing.map(([x, y]) => Math.atan2(-x, y))
  if (leans.length === 0) return 0
  const near = leans.filter((lean) => lean >= -1e-6 && lean <= Math.PI / 2 + 1e-6)
  const lean = Math.max(...(near.length > 0 ? near : [0]))
  // a bank on its side is looked at from above
  return lean > 0.49 * Math.PI ? Math.PI / 2 : -lean
}
