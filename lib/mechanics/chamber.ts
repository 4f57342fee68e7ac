import type { DeadCentres } from './dead-centres'
import { pistonHeight } from './link-rod'
import type { RodPath } from './rod-path'
import type { Train } from './train'

/** The gas space over one piston: what turns a crank angle into a volume. SI. */
export interface Chamber {
  paths: readonly RodPath[]
  index: number
  /** Crank angle of firing top dead centre. */
  fires: number
  topHeight: number
  area: number
  /** Volume at top dead centre: area × true travel / (compression ratio − 1). */
  clearance: number
}

export function chambers(
  train: Train,
  paths: readonly RodPath[],
  centres: readonly DeadCentres[],
  fires: ArrayLike<number>,
): Chamber[] {
  return train.cylinders.map((cylinder, index) => {
    const { topHeight, bottomHeight } = centres[index]
    const area = (Math.PI / 4) * cylinder.bore ** 2
    const clearance = (area * (topHeight - bottomHeight)) / (cylinder.compressionRatio - 1)
    return { paths, index, fires: fires[index], topHeight, area, clearance }
  })
}

/** Gas volume at `angle` from firing top dead centre, rad: V = V(clearance) + A·(s at top − s), m³. */
export const chamberVolume = (chamber: Chamber, angle: number): number =>
  chamber.clearance +
  chamber.area * (chamber.topHeight - pistonHeight(chamber.paths, chamber.index, chamber.fires + angle))

/** Two chambers of one key have the same volume at the same angle from firing top dead centre. */
export function chamberKey({ paths, index, area, clearance }: Chamber): string {
  const path = paths[index]
  const own = [area, clearance, path.radius, path.length, path.offset]
  if (path.master < 0) return own.join()
  const master = paths[path.master]
  return [
    ...own,
    path.knuckleRadius,
    path.knucklePhase,
    master.bank - path.bank,
    master.length,
    master.offset,
  ].join()
}
