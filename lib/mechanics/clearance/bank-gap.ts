import { pistonHeight } from '../link-rod'
import { placed, separation } from './separation'
import type { ClearanceModel, Solid } from './sizes'

/**
 * Between two pistons of different banks at crank angle θ, m: the rectangles of bore × (skirt to crown), each on its
 * cylinder's axis, by the separating-axis test. At full width where one piston's axis passes through the other's bore;
 * where they overlap less along the crank, at the width they have midway between them.
 * Source: the test over the cycle is common practice.
 */
export function bankToBank(model: ClearanceModel, one: number, other: number) {
  const { cylinders } = model.train
  const apart = Math.abs(cylinders[one].axial - cylinders[other].axial)
  const a = pistonAt(model, one, apart)
  const b = pistonAt(model, other, apart)
  return (theta: number) => separation(a(theta), b(theta))
}

/** The piston's rectangle in the plane across the crank, (up, towards +90°), at any crank angle. */
function pistonAt({ train, paths, sizes }: ClearanceModel, cylinder: number, apart: number) {
  const { bore, bank, offset } = train.cylinders[cylinder]
  const { crown, skirt } = sizes.pistons[cylinder]!
  const radius = bore / 2
  const half = apart < radius ? radius : Math.sqrt(Math.max(radius ** 2 - apart ** 2 / 4, 0))
  const rectangle: Solid = {
    points: Float64Array.of(-skirt, -half, crown, -half, crown, half, -skirt, half),
    round: 0,
  }
  const [cos, sin] = [Math.cos(train.banks[bank].angle), Math.sin(train.banks[bank].angle)]
  return (theta: number) => {
    const s = pistonHeight(paths, cylinder, theta)
    return placed(rectangle, cos, sin, s * cos - offset * sin, s * sin + offset * cos)
  }
}
