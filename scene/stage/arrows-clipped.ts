import { buildInstant, fillInstant } from '@/lib/mechanics/plan'
import { buildArrows, COUPLE, fillArrows } from '@/scene/frame/arrows'
import { fillViewProjection, project } from '@/scene/frame/camera'
import { buildPose, fillPose } from '@/scene/frame/pose'
import type { Camera } from '@/scene/frame/types'
import type { Overlays } from '@/scene/model/scene'
import type { StageModel } from './types'

/** Looks at the cycle; between two of them an arrow's tip goes no further than a few pixels. */
const looks = 96

/** Whether an arrow reaches over the edge of the sheet anywhere in the cycle, at this scale of force. */
export function arrowsClipped(
  { rig, plan }: StageModel,
  overlays: Overlays,
  camera: Camera,
  sheet: { width: number; height: number },
  metresPerNewton: number,
): boolean {
  const { width, height } = sheet
  const arrows = buildArrows(rig, plan.train)
  const instant = buildInstant(plan)
  const pose = buildPose(rig)
  const viewProjection = new Float64Array(16)
  fillViewProjection(viewProjection, new Float64Array(3), camera, width / height)
  const tip = new Float64Array(3)
  for (let look = 0; look < looks; look++) {
    const angle = (plan.train.cycle * look) / looks
    fillPose(pose, rig, angle)
    fillInstant(instant, plan, angle)
    const { count, kinds, tips } = fillArrows(arrows, rig, pose, instant, overlays, metresPerNewton)
    for (let i = 0; i < count; i++) {
      if (kinds[i] === COUPLE) continue
      const seen = project(tip, viewProjection, tips[3 * i], tips[3 * i + 1], tips[3 * i + 2], width, height)
      if (!seen || tip[0] < 0 || tip[0] > width || tip[1] < 0 || tip[1] > height) return true
    }
  }
  return false
}
