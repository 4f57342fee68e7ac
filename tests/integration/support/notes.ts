import { pinnables } from '@/scene/frame/anchor-issues'
import { buildRig } from '@/scene/frame/build-rig'
import type { Anchor } from '@/scene/model/anchor'
import type { CrankTrain } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import { preset, sceneOf } from './documents'

const parts = new Map<string, ReturnType<typeof pinnables>>()

function partsOf(name: string) {
  const train: CrankTrain = preset(name)
  const known = parts.get(name) ?? pinnables(buildRig(train, toTrain(train)))
  parts.set(name, known)
  return known
}

/** An anchor at the middle of a part of a preset. */
export function anchorOn(name: string, partId: string, more: Partial<Anchor> = {}): Anchor {
  const box = partsOf(name).find(({ id }) => id === partId)?.boxMm ?? [0, 0, 0, 0, 0, 0]
  const { overlays } = sceneOf(name).view
  return {
    version: 1,
    partId,
    pointMm: [0, 1, 2].map((k) => (box[k] + box[k + 3]) / 2) as [number, number, number],
    angleDeg: 90,
    playing: false,
    speedRpm: 6000,
    camera: { yawDeg: 35, pitchDeg: 12, distanceMm: 2400, targetMm: [0, 40, 10] },
    view: null,
    hidden: ['bores'],
    ghost: [],
    overlays,
    sectionAxialMm: null,
    units: 'si',
    ...more,
  }
}
