import { orbit, pan, zoom } from '@/scene/frame/camera-moves'
import type { Camera } from '@/scene/frame/types'

/** What a hand does to a camera, in CSS pixels on a sheet `height` high. */

const radiansPerPixel = (0.4 * Math.PI) / 180

/** The engine follows the hand: to the right turns the eye to its left, down lifts it. */
export const drag = (camera: Camera, dx: number, dy: number): Camera =>
  orbit(camera, dx * radiansPerPixel, dy * radiansPerPixel)

/** What is under the hand stays under it. */
export const shove = (camera: Camera, dx: number, dy: number, height: number): Camera =>
  pan(camera, dx / height, -dy / height)

/** Multiplies the distance, holding the point (x, y from the middle of the sheet, y down) where it is. */
export function zoomAt(
  camera: Camera,
  factor: number,
  x: number,
  y: number,
  height: number,
  bounds: Float64Array,
): Camera {
  return shove(zoom(shove(camera, -x, -y, height), factor, bounds), x, y, height)
}

export const metresPerPixel = (camera: Camera, height: number): number =>
  (2 * Math.tan(camera.fov / 2) * camera.distance) / height
