import { crankUnbalances } from './crank-unbalance'
import type { Cylinder, Train } from './train'

/** The two-mass split of one cylinder: what goes with the piston, what with the crank pin, kg. */
export interface MassSplit {
  reciprocating: number
  rotating: number
}

/** Rod mass m with its centre of gravity at h from the big end: m·h/l with the piston, m·(l − h)/l with the pin. */
export function massSplit({ rod, rodLength, pistonMass, bigEndBearing }: Cylinder): MassSplit {
  const small = (rod.mass * rod.cgFromBigEnd) / rodLength
  return { reciprocating: pistonMass + small, rotating: bigEndBearing + rod.mass - small }
}

/** What hangs on one throw on the balancing machine, kg. */
export interface BobWeight extends MassSplit {
  oil: number
  /** rotating + oil + balance factor × reciprocating. */
  mass: number
}

export function bobWeights(train: Train): BobWeight[] {
  return train.throws.map((_, index) => {
    const on = train.cylinders.filter((cylinder) => cylinder.throw === index)
    const total = (mass: (cylinder: Cylinder) => number) =>
      on.reduce((sum, cylinder) => sum + mass(cylinder), 0)
    const reciprocating = total((cylinder) => massSplit(cylinder).reciprocating)
    const rotating = total((cylinder) => massSplit(cylinder).rotating)
    const oil = total((cylinder) => cylinder.oilAllowance)
    return { reciprocating, rotating, oil, mass: rotating + oil + train.balanceFactor * reciprocating }
  })
}

/** A rotating unbalance fixed in the crank: size and angle, kg m (or kg m² for a couple) and rad. */
export interface Phasor {
  size: number
  angle: number
}

/** Mass × radius of each throw's bob-weight, without the oil. */
export const hungUnbalances = (train: Train) =>
  bobWeights(train).map(({ mass, oil }, index) => {
    const { angle, axial, radius } = train.throws[index]
    return { angle, axial, unbalance: (mass - oil) * radius }
  })

/** Below this share of the unbalances that cancel, what is left is rounding. */
const ROUNDING = 1e-13

/**
 * What is left of crank, bob-weights and counterweights together, and its couple about the reference place. The oil
 * allowance is no part of it: it is on the bob-weight card only.
 */
export function residualUnbalance(train: Train): { static: Phasor; couple: Phasor } {
  const all = [...crankUnbalances(train), ...hungUnbalances(train)]
  return {
    static: sum(all.map(({ angle, unbalance }) => ({ angle, size: unbalance }))),
    couple: sum(
      all.map(({ angle, axial, unbalance }) => ({ angle, size: (axial - train.referenceAxial) * unbalance })),
    ),
  }
}

function sum(phasors: readonly Phasor[]): Phasor {
  let [vertical, horizontal, whole] = [0, 0, 0]
  for (const { size, angle } of phasors) {
    vertical += size * Math.cos(angle)
    horizontal += size * Math.sin(angle)
    whole += Math.abs(size)
  }
  const size = Math.hypot(vertical, horizontal)
  return size <= ROUNDING * whole ? { size: 0, angle: 0 } : { size, angle: Math.atan2(horizontal, vertical) }
}

/**
 * Permissible residual unbalance U = m·(e·ω)/ω, kg m, for a balance quality grade e·ω (m/s: G 16 is 0.016) at ω rad/s;
 * m kg. Source: ISO 21940-11:2016, permissible residual unbalance. Null where the speed is 0.
 */
export const permissibleUnbalance = (mass: number, grade: number, speed: number): number | null =>
  speed > 0 ? (mass * grade) / speed : null
