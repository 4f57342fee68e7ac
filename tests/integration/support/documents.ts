import { readFileSync } from 'node:fs'
import { crankTrainSchema } from '@/scene/model/crank-train'
import type { Scene } from '@/scene/model/scene'

export const preset = (name: string) =>
  crankTrainSchema.parse(JSON.parse(readFileSync(`scene/model/presets/${name}.json`, 'utf8')))

export function sceneOf(name: string, view: Partial<Scene['view']> = {}): Scene {
  return {
    format: 'scene/1',
    train: preset(name),
    view: {
      angleDeg: 0,
      speedRpm: 3000,
      slowdown: 200,
      reverse: false,
      playing: true,
      camera: null,
      hidden: [],
      ghost: [],
      sectionAxialMm: null,
      overlays: {
        gas: false,
        inertia: false,
        total: true,
        on: { pistons: true, crankPins: false, mains: false },
        shaking: true,
        orbit: true,
        firing: true,
        pressure: false,
        labels: true,
      },
      ...view,
    },
  }
}
