import { bobWeights, massSplit, permissibleUnbalance, residualUnbalance } from '../balance'
import type { Plan } from '../instant'
import { byId, DEGREES, KG_MM, KG_MM2 } from './recorder'

export interface Balance {
  /** Two-mass split of the rod. */
  cylinders: Record<string, { reciprocatingKg: number; rotatingKg: number }>
  /** kg = rotating + oil + balance factor × reciprocating. */
  bobWeights: Record<string, { kg: number; reciprocatingKg: number; rotatingKg: number; oilKg: number }>
  /** Crank, bob-weights and counterweights together, about the reference place. */
  residual: { staticKgMm: number; staticAngleDeg: number; coupleKgMm2: number; coupleAngleDeg: number }
  /** ISO 21940-11 at the greatest speed, or at the analysed one where none is given; null without a crank mass. */
  grade: { permissibleKgMm: number; gradeMmS: number } | null
}

export const residualAnswer = (residual: ReturnType<typeof residualUnbalance>): Balance['residual'] => ({
  staticKgMm: residual.static.size * KG_MM,
  staticAngleDeg: residual.static.angle * DEGREES,
  coupleKgMm2: residual.couple.size * KG_MM2,
  coupleAngleDeg: residual.couple.angle * DEGREES,
})

export function balanceAnswer({ train, speed }: Plan, gradeMmS: number): Balance {
  const weights = bobWeights(train)
  const residual = residualUnbalance(train)
  const permissible =
    train.crankMass === undefined
      ? null
      : permissibleUnbalance(train.crankMass, gradeMmS / 1000, train.operating.max ?? speed)
  return {
    cylinders: byId(train.cylinders, (cylinder) => {
      const { reciprocating, rotating } = massSplit(cylinder)
      return { reciprocatingKg: reciprocating, rotatingKg: rotating }
    }),
    bobWeights: byId(train.throws, (_, index) => {
      const { mass, reciprocating, rotating, oil } = weights[index]
      return { kg: mass, reciprocatingKg: reciprocating, rotatingKg: rotating, oilKg: oil }
    }),
    residual: residualAnswer(residual),
    grade: permissible === null ? null : { permissibleKgMm: permissible * KG_MM, gradeMmS },
  }
}
