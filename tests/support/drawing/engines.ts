import { readdirSync, readFileSync } from 'node:fs'
import { buildRig } from '@/scene/frame/build-rig'
import { fillViewProjection, frameCamera } from '@/scene/frame/camera'
import { buildPose, fillPose } from '@/scene/frame/pose'
import type { Rig } from '@/scene/frame/types'
import { defaultPitch, defaultYaw } from '@/scene/frame/view-direction'
import { crankTrainSchema } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import type { RasterFrame } from '@/scene/canvas/raster/types'

const folder = new URL('../../../scene/model/presets/', import.meta.url)

export const presetNames = readdirSync(folder)
  .filter((file) => file.endsWith('.json'))
  .map((file) => file.slice(0, -5))

export function presetRig(name: string): Rig {
  const document = crankTrainSchema.parse(JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8')))
  return buildRig(document, toTrain(document))
}

export interface Shot {
  angleDeg?: number
  yaw?: number
  pitch?: number
  /** 1 has the whole engine on the sheet. */
  zoom?: number
  aspect?: number
}

/** A view at the middle of the engine, without `yaw` and `pitch` the free one. */
export function shotOf(rig: Rig, shot: Shot = {}): RasterFrame {
  const { angleDeg = 22, yaw = defaultYaw, pitch = defaultPitch, zoom = 1, aspect = 16 / 9 } = shot
  const camera = frameCamera(rig.bounds, aspect, { yaw, pitch })
  camera.distance /= zoom
  const viewProjection = new Float64Array(16)
  const eye = new Float64Array(3)
  fillViewProjection(viewProjection, eye, camera, aspect)
  const pose = fillPose(buildPose(rig), rig, (angleDeg * Math.PI) / 180)
  return { pose, viewProjection, eye, tint: new Float32Array(rig.anchors.firing.length) }
}
