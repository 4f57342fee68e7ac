/** Which two mains carry a load at one place, and the share of the second (may be beyond 0…1 outside the last main). */
export interface Carried {
  first: number
  share: number
}

/**
 * A load at `axial` on its two neighbouring mains by the lever rule, as if the crank were hinged at every main; beyond
 * the last main, on the last two. `mains` ascending, two or more.
 */
export function carriedBy(mains: readonly { axial: number }[], axial: number): Carried {
  let first = 0
  while (first < mains.length - 2 && axial > mains[first + 1].axial) first++
  const [near, far] = [mains[first].axial, mains[first + 1].axial]
  return { first, share: (axial - near) / (far - near) }
}
