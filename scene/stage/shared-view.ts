import { fillAxes, type ViewDirection } from '@/scene/frame/camera'
import { extentOf } from '@/scene/frame/extent'
import { boreStack, niceScale } from '@/scene/frame/nice-scale'
import type { Camera, Rig } from '@/scene/frame/types'
import { metresPerPixel } from './camera-moves'
import type { StageModel } from './types'

/** How engines are looked at together: one direction and distance, and how far each is moved from its own middle, m. */
export interface Shot extends ViewDirection {
  distance: number
  offset: [number, number, number]
}

const middleOf = ({ bounds }: Rig): [number, number, number] => [
  (bounds[0] + bounds[3]) / 2,
  (bounds[1] + bounds[4]) / 2,
  (bounds[2] + bounds[5]) / 2,
]

const FOV = (16 * Math.PI) / 180

/** Share of the sheet that an engine may fill. */
const FILL = 0.92

/** The nearest shot from this direction that has every engine whole on a sheet of these proportions, about its middle. */
export function shotOf(rigs: readonly Rig[], aspect: number, direction: ViewDirection): Shot {
  const axes = new Float64Array(9)
  fillAxes(axes, direction)
  const tangent = Math.tan(FOV / 2) * FILL
  let distance = 0
  for (const rig of rigs) {
    const points = extentOf(rig)
    const middle = middleOf(rig)
    for (let i = 0; i < points.length; i += 3) {
      const along = (axis: number) =>
        middle.reduce((sum, at, k) => sum + axes[3 * axis + k] * (points[i + k] - at), 0)
      const needed = Math.max(Math.abs(along(0)) / aspect, Math.abs(along(1))) / tangent
      distance = Math.max(distance, along(2) + needed)
    }
  }
  return { ...direction, distance, offset: [0, 0, 0] }
}

export function cameraOfShot({ yaw, pitch, distance, offset }: Shot, rig: Rig): Camera {
  const [x, y, z] = middleOf(rig)
  return { yaw, pitch, distance, fov: FOV, target: [x + offset[0], y + offset[1], z + offset[2]] }
}

export function shotOfCamera({ yaw, pitch, distance, target }: Camera, rig: Rig): Shot {
  const middle = middleOf(rig)
  return { yaw, pitch, distance, offset: target.map((at, k) => at - middle[k]) as [number, number, number] }
}

/** CSS pixels in a centimetre. */
export const pixelsPerCm = 96 / 2.54

/** Newtons that a centimetre of arrow stands for on a sheet this high. */
export const newtonsPerCm = (metresPerNewton: number, camera: Camera, height: number): number =>
  (pixelsPerCm * metresPerPixel(camera, height)) / metresPerNewton

/** The scale of force of one engine alone. */
export const ownScale = ({ rig, peakForce }: StageModel): number =>
  niceScale(peakForce, boreStack(rig)).metresPerNewton

/** One scale for all: the largest force of any over the largest engine, as one engine alone has it. */
export function commonScale(models: readonly StageModel[]): number {
  const peak = Math.max(...models.map(({ peakForce }) => peakForce))
  const stack = Math.max(...models.map(({ rig }) => boreStack(rig)))
  return niceScale(peak, stack).metresPerNewton
}
