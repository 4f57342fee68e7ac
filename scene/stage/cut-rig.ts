import { sectionRig } from '@/scene/frame/section'
import type { Rig } from '@/scene/frame/types'

/** The last cut made of each rig: looking about does not cut again, and panes share one. */
const cuts = new WeakMap<Rig, { axial: number; rig: Rig }>()

/** The rig behind a plane across the crank, m; whole where there is none. */
export function cutRig(rig: Rig, axial: number | null): Rig {
  if (axial === null) return rig
  const kept = cuts.get(rig)
  if (kept?.axial === axial) return kept.rig
  const cut = sectionRig(rig, axial)
  cuts.set(rig, { axial, rig: cut })
  return cut
}
