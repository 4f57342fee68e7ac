import { buildPose, fillPose } from './pose'
import type { Rig } from './types'

/** Part ids of two versions of an engine: of another form or another motion, only in the newer, only in the older. */
export interface ChangedParts {
  changed: string[]
  added: string[]
  removed: string[]
}

/** m, and as much in a cosine: below display precision, and below what can be drawn. */
const SAME = 5e-5
const POSES = 8

const alike = (one: ArrayLike<number>, other: ArrayLike<number>, from: number, at: number, count: number) => {
  for (let i = 0; i < count; i++) if (Math.abs(one[from + i] - other[at + i]) > SAME) return false
  return true
}

/** What a drawing of the one over the other shows apart. Parts are the same by their id, whatever their place in the list. */
export function changedParts(older: Rig, newer: Rig): ChangedParts {
  const before = new Map(older.parts.map((part, index) => [part.id, index]))
  const after = new Set(newer.parts.map(({ id }) => id))
  const poses = Array.from({ length: POSES }, (_, k) => {
    const angle = (2 * Math.PI * k) / POSES
    return [fillPose(buildPose(older), older, angle), fillPose(buildPose(newer), newer, angle)]
  })
  const same = (was: number, now: number) => {
    const one = older.meshes[older.parts[was].mesh].positions
    const other = newer.meshes[newer.parts[now].mesh].positions
    return (
      one.length === other.length &&
      alike(one, other, 0, 0, one.length) &&
      poses.every(([then, here]) => alike(then, here, 4 * was, 4 * now, 4))
    )
  }
  return {
    changed: newer.parts.flatMap(({ id }, now) => {
      const was = before.get(id)
      return was === undefined || same(was, now) ? [] : [id]
    }),
    added: newer.parts.flatMap(({ id }) => (before.has(id) ? [] : [id])),
    removed: older.parts.flatMap(({ id }) => (after.has(id) ? [] : [id])),
  }
}
