import { massSplit, residualUnbalance, type Phasor } from '../balance'
import type { Train } from '../train'
import { complex, minus, phasor } from './phasor'

/** A part that is swapped for a heavier or lighter one: a piston with what goes with it, or a big end with its shells. */
export interface MassChange {
  /** Indices of the cylinders it is changed in. */
  cylinders: readonly number[]
  moves: 'reciprocating' | 'rotating'
  /** kg each, signed. */
  mass: number
}

/** The crank's residual against a bob-weight, kg m and kg m² about the reference place. */
interface Residual {
  static: Phasor
  couple: Phasor
}

export interface MassEffect {
  before: Residual
  after: Residual
  /** What the change alone adds to the residual: it turns with the crank. */
  change: Residual
  /** What it adds to the first-order force along the bore of each cylinder it is made in, at 1 rad/s: mass × throw, kg m. */
  alongBore: number
}

/**
 * What changing a part's mass does to a crank that is not balanced again: bob-weights change by the mass (rotating) or
 * the balance factor's share of it (reciprocating), so the residual changes by that × throw radius at the throw's angle
 * and place. Throws RangeError where a part would weigh nothing or less.
 */
export function massEffect(train: Train, { cylinders, moves, mass }: MassChange): MassEffect {
  const changed: Train = {
    ...train,
    cylinders: train.cylinders.map((cylinder, index) => {
      if (!cylinders.includes(index)) return cylinder
      const weighs = massSplit(cylinder)[moves] + mass
      if (!(weighs > 0))
        throw new RangeError(`The ${moves} parts of cylinder ${cylinder.id} would weigh ${weighs} kg.`)
      return moves === 'reciprocating'
        ? { ...cylinder, pistonMass: cylinder.pistonMass + mass }
        : { ...cylinder, bigEndBearing: cylinder.bigEndBearing + mass }
    }),
  }
  const [before, after] = [residualUnbalance(train), residualUnbalance(changed)]
  const difference = (kind: 'static' | 'couple') => phasor(minus(complex(after[kind]), complex(before[kind])))
  const radius = Math.max(0, ...cylinders.map((index) => train.throws[train.cylinders[index].throw].radius))
  return {
    before,
    after,
    change: { static: difference('static'), couple: difference('couple') },
    alongBore: Math.abs(mass) * radius,
  }
}
