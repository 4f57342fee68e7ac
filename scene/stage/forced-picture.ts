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
import type { Picture, StageModel } from './types'

/** A picture with what the kernel knows of its angle. */
export interface ForcedPicture extends Picture {
  model: StageModel
  instant: Instant
  burn: Burn
  /** Which cylinders burn, at the instant's angle. */
  markers: FiringMarkers
}

export function createForced(picture: Picture, model: StageModel): ForcedPicture {
  const { train } = model.plan
  return {
    ...picture,
    model,
    instant: buildInstant(model.plan),
    burn: burnOf(train.gas),
    markers: buildFiringMarkers(train.cylinders.length),
  }
}

/** Forces, firings and tints at one crank angle. Allocates nothing. */
export function turnForced(picture: ForcedPicture, angle: number, tinted: boolean): void {
  const { model, instant, burn, markers, frame } = picture
  const { cycle, crankcasePressure } = model.plan.train
  fillInstant(instant, model.plan, angle)
  fillFiringMarkers(markers, model.events, cycle, burn, angle)
  if (tinted) fillTint(frame.tint, instant.pressure, crankcasePressure, model.peakPressure)
  else frame.tint.fill(0)
}
