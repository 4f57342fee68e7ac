import { directionOf } from './camera'
import { namedViews, type NamedView } from './named-views'
import type { Camera, Rig } from './types'

const near = 1e-6

/** The named view whose direction a camera has, if it has one's. */
export const viewNameOf = ({ yaw, pitch }: Camera, rig: Rig): NamedView | null =>
  namedViews.find((name) => {
    const named = directionOf(name, rig)
    return Math.abs(named.yaw - yaw) < near && Math.abs(named.pitch - pitch) < near
  }) ?? null
