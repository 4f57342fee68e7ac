import { formatNumber } from '@/lib/units/format'
import type { Anchor, VectorId } from '@/scene/model/anchor'
import type { CrankTrain } from '@/scene/model/crank-train'
import { refuse, type Issue } from '@/scene/model/issue'
import type { Rig } from './types'

/** What a note can be pinned to: its name in words, and its box in its own coordinates. */
export interface Pinnable {
  id: string
  label: string
  /** minX, minY, minZ, maxX, maxY, maxZ */
  boxMm: number[]
}

const vectorLabels: Record<VectorId, string> = {
  'vector:total-force': 'Shaking force of the whole engine',
  'vector:total-couple': 'Shaking couple of the whole engine',
}

const tenths = (value: number) => formatNumber(value, { decimals: 1 })
const millimetres = (metres: ArrayLike<number>) => Array.from(metres, (each) => each * 1000)

/** Everything of a rig that can be pinned: its parts, and the resultants in the coordinates of the engine. */
export const pinnables = (rig: Rig): Pinnable[] => [
  ...rig.parts.map(({ id, label, mesh }) => ({ id, label, boxMm: millimetres(rig.meshes[mesh].box) })),
  ...Object.entries(vectorLabels).map(([id, label]) => ({ id, label, boxMm: millimetres(rig.bounds) })),
]

/** A picked point lies on the surface, give or take what a picture rounds. */
const marginMm = (boxMm: readonly number[]) =>
  Math.max(1, 0.02 * Math.max(...[0, 1, 2].map((axis) => boxMm[axis + 3] - boxMm[axis])))

/** What stands in the way of pinning a note here; paths begin at the anchor. */
export function anchorIssues(
  anchor: Anchor,
  parts: readonly Pinnable[],
  { cycle }: Pick<CrankTrain, 'cycle'>,
): Issue[] {
  const part = parts.find(({ id }) => id === anchor.partId)
  return [...(part ? pointIssues(anchor, part) : unknownPart(anchor, parts)), ...angleIssues(anchor, cycle)]
}

const unknownPart = ({ partId, version }: Anchor, parts: readonly Pinnable[]) =>
  refuse(
    ['partId'],
    'unknown-part',
    `Version ${version} has no part “${partId}”.`,
    `Give one of its ${parts.length}, such as “${parts[0].id}”.`,
  )

function pointIssues({ pointMm }: Anchor, { label, boxMm }: Pinnable): Issue[] {
  const margin = marginMm(boxMm)
  return ['x', 'y', 'z'].flatMap((axis, k) => {
    const [least, most] = [boxMm[k] - margin, boxMm[k + 3] + margin]
    if (pointMm[k] >= least && pointMm[k] <= most) return []
    const range = `${tenths(boxMm[k])} to ${tenths(boxMm[k + 3])} mm`
    return refuse(
      [`pointMm.${k}`],
      'off-the-part',
      `The point lies beside ${label}: ${axis} is ${tenths(pointMm[k])} mm, and the part goes from ${range}.`,
      'Pin it to a point on the part.',
    )
  })
}

function angleIssues({ angleDeg }: Anchor, cycle: CrankTrain['cycle']): Issue[] {
  const wholeDeg = cycle === 'two-stroke' ? 360 : 720
  if (angleDeg < wholeDeg) return []
  return refuse(
    ['angleDeg'],
    'outside-the-cycle',
    `The crank angle is ${tenths(angleDeg)}°, and a ${cycle} cycle ends at ${wholeDeg}°.`,
    `Give ${tenths(angleDeg % wholeDeg)}°.`,
  )
}
