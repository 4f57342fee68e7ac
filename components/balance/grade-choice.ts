import { permissibleUnbalance } from '@/lib/mechanics/balance'
import { toleranceShares } from '@/lib/mechanics/balance/two-planes'
import type { Train } from '@/lib/mechanics/train'

/** What ISO 21940-11 allows in each of two planes at a grade, mm/s, with the crank's mass half-way; null without a mass or speed. */
export function permissibleIn(
  { crankMass, operating }: Train,
  [a, b]: readonly [number, number],
  gradeMmS: number,
): [number, number] | [null, null] {
  const whole =
    crankMass === undefined || operating.max === undefined
      ? null
      : permissibleUnbalance(crankMass, gradeMmS / 1000, operating.max)
  if (whole === null) return [null, null]
  const [near, far] = toleranceShares(a, b, (a + b) / 2)
  return [whole * near, whole * far]
}

/** The grade of an inherently balanced crank on rigid mounts (ISO 21940-11). */
export const USUAL_GRADE = 16
