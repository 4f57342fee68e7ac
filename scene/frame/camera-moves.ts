import { fillAxes } from './camera'
import type { Camera } from './types'
import { eyeDirection } from './view-direction'

const STEEPEST = Math.PI / 2
const FARTHEST = 12

const axes = new Float64Array(9)

/** Turned about its target; over the top and no further. */
export function orbit(camera: Camera, dyaw: number, dpitch: number): Camera {
  const pitch = Math.min(Math.max(camera.pitch + dpitch, -STEEPEST), STEEPEST)
  return { ...camera, yaw: wrapped(camera.yaw + dyaw), pitch }
}

const wrapped = (angle: number) => angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI))

/** Moves the picture to the right and up by these shares of the sheet's height. */
export function pan(camera: Camera, right: number, up: number): Camera {
  fillAxes(axes, camera)
  const height = 2 * camera.distance * Math.tan(camera.fov / 2)
  const target = camera.target.map((at, k) => at - height * (axes[k] * right + axes[3 + k] * up))
  return { ...camera, target: target as [number, number, number] }
}

/** Nearer (factor < 1) or farther; the eye stays outside the engine's box and in sight of it. */
export function zoom(camera: Camera, factor: number, bounds: ArrayLike<number>): Camera {
  return keptOutside({ ...camera, distance: camera.distance * factor }, bounds)
}

/** The camera, moved back along its line of sight where the eye would stand in the engine's box. */
export function keptOutside(camera: Camera, bounds: ArrayLike<number>): Camera {
  const size = Math.hypot(bounds[3] - bounds[0], bounds[4] - bounds[1], bounds[5] - bounds[2])
  const direction = eyeDirection(camera.yaw, camera.pitch)
  let exit = Infinity
  let enter = -Infinity
  for (let k = 0; k < 3; k++) {
    const one = (bounds[k] - camera.target[k]) / direction[k]
    const other = (bounds[k + 3] - camera.target[k]) / direction[k]
    if (Number.isNaN(one) || Number.isNaN(other)) continue
    enter = Math.max(enter, Math.min(one, other))
    exit = Math.min(exit, Math.max(one, other))
  }
  const crossed = exit > enter && exit > 0
  const least = (crossed ? exit : 0) + 0.03 * size
  return { ...camera, distance: Math.min(Math.max(camera.distance, least), FARTHEST * size) }
}
