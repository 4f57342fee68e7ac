import type { Instant } from '@/lib/mechanics/instant'
import { buildInstant, fillInstant } from '@/lib/mechanics/plan'
import {
  buildFiringMarkers,
  burnOf,
  fillFiringMarkers,
  fillTint,
  type Burn,
  type FiringMarkers,
} from '@/scene/frame/firing-markers'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { sectionRig } from '@/scene/frame/section'
import {
  GHOST,
  HIDDEN,
  LIT,
  SHOWN,
  type Frame,
  type Pose,
  type Rig,
  type Visibility,
} from '@/scene/frame/types'
import type { StageLook, StageModel } from './types'

/** Everything one stage draws from, in buffers that live as long as the model does. */
export interface Picture {
  model: StageModel
  sectionAxial: number | null
  rig: Rig
  pose: Pose
  visibility: Visibility
  instant: Instant
  burn: Burn
  /** Which cylinders burn, at the instant's angle. */
  markers: FiringMarkers
  frame: Frame
}

export function createPicture(model: StageModel, sectionAxial: number | null): Picture {
  const rig = cutRig(model.rig, sectionAxial)
  const pose = buildPose(rig)
  const { train } = model.plan
  return {
    model,
    sectionAxial,
    rig,
    pose,
    visibility: new Uint8Array(rig.parts.length).fill(SHOWN),
    instant: buildInstant(model.plan),
    burn: burnOf(train.gas),
    markers: buildFiringMarkers(train.cylinders.length),
    frame: {
      pose,
      viewProjection: new Float64Array(16),
      eye: new Float64Array(3),
      tint: new Float32Array(train.cylinders.length),
      still: false,
    },
  }
}

/** The last cut made of each rig: looking about does not cut again. */
const cuts = new WeakMap<Rig, { axial: number; rig: Rig }>()

function cutRig(rig: Rig, axial: number | null): Rig {
  if (axial === null) return rig
  const kept = cuts.get(rig)
  if (kept?.axial === axial) return kept.rig
  const cut = sectionRig(rig, axial)
  cuts.set(rig, { axial, rig: cut })
  return cut
}

export function fillVisibility({ rig, visibility }: Picture, look: StageLook): void {
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

/** Parts, forces and tints at one crank angle. Allocates nothing. */
export function turnPicture(picture: Picture, angle: number, tinted: boolean): void {
  const { model, rig, pose, instant, burn, markers, frame } = picture
  const { cycle, crankcasePressure } = model.plan.train
  fillPose(pose, rig, angle)
  fillInstant(instant, model.plan, angle)
  fillFiringMarkers(markers, model.events, cycle, burn, angle)
  if (tinted) fillTint(frame.tint, instant.pressure, crankcasePressure, model.peakPressure)
  else frame.tint.fill(0)
}
