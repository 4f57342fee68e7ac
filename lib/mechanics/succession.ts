import type { Train } from './train'

/** How often one firing follows another on the same or a neighbouring part of the engine, all the way round the cycle. */
export interface Succession {
  sameBank: number
  sameThrow: number
  /** On the next throw along the crank; the two throws of a split pin are neighbours. */
  adjacentThrow: number
}

/**
 * Successions of a firing order: each cylinder is compared with the one that fires after it, the last with the first, so
 * n cylinders give n pairs (one cylinder alone gives none: it follows only itself). Two throws are adjacent when no other
 * throw stands between them along the crank; a pair on one throw counts as same throw and not as adjacent.
 * For the cross-plane V8's 1-8-4-3-6-5-7-2 (cylinders 1·2, 3·4, 5·6, 7·8 on throws 1 to 4) this gives 2 on one bank, 3 on
 * one throw and 2 on neighbours (common practice).
 * `order`: indices of cylinders, each once.
 */
export function succession(train: Train, order: readonly number[]): Succession {
  const along = train.throws.map((_, index) => index)
  along.sort((one, other) => train.throws[one].axial - train.throws[other].axial)
  const place = along.map((_, index) => along.indexOf(index))
  const count: Succession = { sameBank: 0, sameThrow: 0, adjacentThrow: 0 }
  if (order.length < 2) return count
  order.forEach((cylinder, at) => {
    const one = train.cylinders[cylinder]
    const next = train.cylinders[order[(at + 1) % order.length]]
    if (one.bank === next.bank) count.sameBank++
    if (one.throw === next.throw) count.sameThrow++
    else if (Math.abs(place[one.throw] - place[next.throw]) === 1) count.adjacentThrow++
  })
  return count
}
