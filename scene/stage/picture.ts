import { buildPose, fillPose } from '@/scene/frame/pose'
import { GHOST, HIDDEN, LIT, SHOWN, type Pose } from '@/scene/frame/types'
import type { MovingModel, Picture, StageLook } from './types'

export function createPicture(model: MovingModel): Picture {
  const { rig } = model
  const pose = buildPose(rig)
  return {
    model,
    rig,
    pose,
    visibility: new Uint8Array(rig.parts.length).fill(SHOWN),
    frame: {
      pose,
      viewProjection: new Float64Array(16),
      eye: new Float64Array(3),
      tint: new Float32Array(rig.anchors.firing.length),
      still: false,
    },
  }
}

export function fillVisibility(
  { rig, visibility }: Picture,
  look: Pick<StageLook, 'hidden' | 'ghost' | 'lit'>,
): void {
  rig.parts.forEach((part, i) => {
    visibility[i] = look.hidden.includes(part.group)
      ? HIDDEN
      : look.lit.includes(part.id)
        ? LIT
        : look.ghost.includes(part.group)
          ? GHOST
          : SHOWN
  })
}

/** Parts at one crank angle. Allocates nothing. */
export const turnPicture = ({ pose, rig }: Picture, angle: number): Pose => fillPose(pose, rig, angle)
