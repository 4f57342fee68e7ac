import type { Rig } from '@/scene/frame/types'

/** A path in the world that is drawn on the sheet: x, y, z in turn. */
export interface SpacePath {
  points: Float64Array
  /** Points in use. */
  count: number
}

export const createPath = (capacity: number): SpacePath => ({
  points: new Float64Array(3 * capacity),
  count: 0,
})

/** Half the diagonal of everything over a whole turn, m. */
const radiusOf = ({ bounds }: Rig): number =>
  Math.hypot(bounds[3] - bounds[0], bounds[4] - bounds[1], bounds[5] - bounds[2]) / 2

const put = (path: SpacePath, x: number, y: number, z: number) => {
  const at = 3 * path.count++
  path.points[at] = x
  path.points[at + 1] = y
  path.points[at + 2] = z
}

/** A full couple turns through this; a smaller one through as much less. */
const fullTurn = (150 * Math.PI) / 180
const arcSteps = 24

/**
 * The rocking couple as an arc in the plane of the crank axis and the couple's own direction, from the drive end towards
 * the side to which it pushes that end. Its span is the couple's share of the greatest in the cycle.
 */
export function fillCoupleArc(
  path: SpacePath,
  rig: Rig,
  vertical: number,
  horizontal: number,
  peak: number,
  axial: number,
): void {
  path.count = 0
  const size = Math.hypot(vertical, horizontal)
  if (peak <= 0 || size < 0.01 * peak) return
  const reach = 0.55 * radiusOf(rig)
  const span = (fullTurn * size) / peak
  const x = (rig.mirror * horizontal) / size
  const y = vertical / size
  for (let i = 0; i <= arcSteps; i++) {
    // Half of the arc on either side of straight along the crank, so that a small one stays at its end.
    const angle = span * (i / arcSteps - 0.5)
    const across = reach * Math.sin(angle)
    put(path, x * across, y * across, axial + reach * Math.cos(angle))
  }
}

/** The arrow of rotation about the free end: positive angles run towards +90°. */
export function fillRotation(path: SpacePath, rig: Rig): void {
  path.count = 0
  const { bounds, anchors, mirror } = rig
  const radius = 0.22 * (bounds[4] - bounds[1])
  const z = anchors.freeEnd[2] - 0.15 * radius
  for (let i = 0; i <= arcSteps; i++) {
    const angle = ((-50 + (100 * i) / arcSteps) * Math.PI) / 180
    put(path, mirror * radius * Math.sin(angle), radius * Math.cos(angle), z)
  }
}
