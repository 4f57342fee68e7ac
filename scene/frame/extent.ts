import { buildPose, fillPose } from './pose'
import type { Pose, Rig } from './types'

type Moving = Pick<Rig, 'meshes' | 'parts' | 'drive'>

/** Angles of the crank, and directions round a turning part, at which its reach is taken. */
const STEPS = 24

/**
 * Points that hold the whole engine over a whole turn, flat x, y, z: corners of the boxes of what stands or swings, and a
 * ring at either end of what turns about an axis of its own.
 */
export function extentOf(rig: Moving): Float64Array {
  const points: number[] = []
  const pose = buildPose(rig)
  for (let step = 0; step < STEPS; step++) {
    fillPose(pose, rig, (2 * Math.PI * step) / STEPS)
    rig.parts.forEach(({ motion }, part) => {
      if (motion.kind === 'crank' || motion.kind === 'shaft') return
      if (motion.kind !== 'fixed' || step === 0) addCorners(points, rig, pose, part)
    })
  }
  rig.parts.forEach(({ motion }, part) => {
    if (motion.kind === 'crank' || motion.kind === 'shaft') addRings(points, rig, pose, part)
  })
  return Float64Array.from(points)
}

function addCorners(points: number[], rig: Moving, pose: Pose, part: number) {
  const { box } = rig.meshes[rig.parts[part].mesh]
  const at = 4 * part
  for (let corner = 0; corner < 8; corner++) {
    const x = box[corner & 1 ? 3 : 0]
    const y = box[corner & 2 ? 4 : 1]
    points.push(
      pose[at] * x - pose[at + 1] * y + pose[at + 2],
      pose[at + 1] * x + pose[at] * y + pose[at + 3],
      box[corner & 4 ? 5 : 2],
    )
  }
}

function addRings(points: number[], rig: Moving, pose: Pose, part: number) {
  const { positions, box } = rig.meshes[rig.parts[part].mesh]
  let square = 0
  for (let i = 0; i < positions.length; i += 3)
    square = Math.max(square, positions[i] ** 2 + positions[i + 1] ** 2)
  const reach = Math.sqrt(square)
  for (let step = 0; step < STEPS; step++) {
    const angle = (2 * Math.PI * step) / STEPS
    const x = pose[4 * part + 2] + reach * Math.cos(angle)
    const y = pose[4 * part + 3] + reach * Math.sin(angle)
    points.push(x, y, box[2], x, y, box[5])
  }
}

/** minX, minY, minZ, maxX, maxY, maxZ */
export function boundsOf(points: Float64Array): Float64Array {
  const bounds = Float64Array.of(Infinity, Infinity, Infinity, -Infinity, -Infinity, -Infinity)
  points.forEach((value, i) => {
    const axis = i % 3
    if (value < bounds[axis]) bounds[axis] = value
    if (value > bounds[axis + 3]) bounds[axis + 3] = value
  })
  return bounds
}

/** The eight corners of a box, flat. */
export const cornersOf = (bounds: ArrayLike<number>): number[] =>
  Array.from({ length: 24 }, (_, i) => bounds[Math.floor(i / 3) & (1 << (i % 3)) ? (i % 3) + 3 : i % 3])
