import { pistonHeight, rodAngleAt } from '../link-rod'
import type { ClearanceModel, RodBody } from './sizes'

/**
 * From a rod's shank to the lower edge of its bore, on the nearer side, at crank angle θ, m. In the rod's own
 * coordinates the edge lies `y` along it from the big end and `x` beside its axis; the gap is |x| less half the shank's
 * width there. While the edge lies beside no part of the shank the gap is that to the shank's nearer end.
 * Source: the plane geometry itself.
 */
export function rodInBore(model: ClearanceModel, cylinder: number) {
  const { train, paths, sizes } = model
  const { bore, rodLength } = train.cylinders[cylinder]
  const bottom = sizes.boreBottoms[cylinder]
  const rod = sizes.rods[cylinder]
  return (theta: number) => {
    const psi = rodAngleAt(paths, cylinder, theta)
    const [cos, sin] = [Math.cos(psi), Math.sin(psi)]
    const down = pistonHeight(paths, cylinder, theta) - bottom
    return Math.min(edge(-bore / 2), edge(bore / 2))

    // from the piston pin the rod runs down by cos ψ and towards +90° by sin ψ
    function edge(side: number): number {
      const along = rodLength - (down * cos + side * sin)
      const beside = Math.abs(side * cos - down * sin)
      return shankGap(rod, along, beside)
    }
  }
}

function shankGap({ shank }: RodBody, along: number, beside: number): number {
  const [first, last] = [shank[0], shank[shank.length - 1]]
  const nearest = Math.min(Math.max(along, first.along), last.along)
  const gap = beside - halfAt(shank, nearest)
  return along === nearest ? gap : Math.hypot(Math.max(gap, 0), along - nearest)
}

/** Half the shank's width, linear between the places where it is known. */
export function halfAt(shank: RodBody['shank'], along: number): number {
  const after = shank.findIndex((place) => place.along >= along)
  if (after <= 0) return shank[after < 0 ? shank.length - 1 : 0].half
  const [from, to] = [shank[after - 1], shank[after]]
  return from.half + ((along - from.along) / (to.along - from.along)) * (to.half - from.half)
}
