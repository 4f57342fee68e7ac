import { pistonHeight } from '../link-rod'
import type { ClearanceModel } from './sizes'

/**
 * From a piston's skirt to a counterweight at crank angle θ, m: s − skirt below the pin − R, the counterweight being
 * the whole circle that its radius R sweeps. Least at bottom dead centre.
 * Source: the rule s(BDC) − skirt − R ≥ 1.5 mm cold is common practice.
 */
export function skirtToCounterweight(model: ClearanceModel, cylinder: number, counterweight: number) {
  const { paths, sizes } = model
  const taken = sizes.pistons[cylinder]!.skirt + sizes.counterweights[counterweight]!.radius
  return (theta: number) => pistonHeight(paths, cylinder, theta) - taken
}

/**
 * From a piston's skirt to a bare web, m: s − skirt − the height of the crank pins at its ends along the cylinder's axis,
 * pins of throws that stand otherwise among them. A web that reaches beyond its pins has that much less.
 */
export function skirtToWeb(model: ClearanceModel, cylinder: number, web: number) {
  const { train, paths, sizes } = model
  const { skirt } = sizes.pistons[cylinder]!
  const { pins } = sizes.webs[web]
  const bank = train.banks[train.cylinders[cylinder].bank].angle
  return (theta: number) => {
    let height = -Infinity
    for (const { angle, throwRadius, radius } of pins)
      height = Math.max(height, throwRadius * Math.cos(theta + angle - bank) + radius)
    return pistonHeight(paths, cylinder, theta) - skirt - height
  }
}
