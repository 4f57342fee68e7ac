import type { Complex } from '@/lib/numerics/fourier'
import { hungUnbalances } from '../balance'
import type { Train } from '../train'
import { leastMass } from './least-mass'
import { leastSquares } from './least-squares'
import { complex, minus, nothing, phasor, plus, scaled } from './phasor'

/** A web, or another plane, that may carry a counterweight: place and radius of its centre of gravity, m (radius above 0). */
export interface Plane {
  id: string
  axial: number
  radius: number
  /** The most it may weigh, kg; `even` does not keep to it. */
  most?: number
  /** A weight that stays as it is: kg, rad. */
  fixed?: { mass: number; angle: number }
}

/**
 * How the weights are shared out: `least-mass` over the whole crank; `even`, the least sum of squared masses over the
 * whole crank; `bay`, the least mass in each bay between two mains by itself, which also spares the mains.
 */
export type SharingRule = 'least-mass' | 'even' | 'bay'

export interface Solved {
  counterweights: Train['counterweights']
  /** Of all counterweights, fixed ones too, kg. */
  mass: number
  /** Nothing lighter balances in these planes, kg. */
  least: number
}

/** Why planes cannot balance a crank, with what would be left: kg m, and kg m² about the reference place. */
export class CannotBalance extends RangeError {
  constructor(
    readonly reason: 'no-plane' | 'one-place' | 'full',
    readonly force: number,
    readonly couple: number,
    /** The throws that are meant, where the rule goes bay by bay. */
    readonly throws?: string[],
  ) {
    super(`These planes cannot balance the crank: ${reason}.`)
  }
}

interface Demand {
  force: Complex
  couple: Complex
  /** Sum of the sizes: what rounding is measured by. */
  whole: number
}

const ROUNDING = 1e-13

/**
 * Counterweights in the given planes that leave crank and bob-weights (without the oil) balanced in force and couple:
 * Σ U_i = −ΣU and Σ z_i·U_i = −Σ z·U, U_i = mass × radius (elementary statics). Throws CannotBalance where the planes
 * cannot: none to set, all at one place with a couple left, or all full.
 */
export function solveCounterweights(
  train: Train,
  planes: readonly Plane[],
  rule: SharingRule = 'least-mass',
): Solved {
  const throws = throwUnbalances(train)
  const bays = rule === 'bay' ? [...new Set(throws.map(({ axial }) => bayOf(train, axial)))] : [0]
  const own = (axial: number) => (rule === 'bay' ? bayOf(train, axial) : 0)
  const masses = planes.map((plane) =>
    plane.fixed ? complex({ size: plane.fixed.mass, angle: plane.fixed.angle }) : nothing,
  )
  let least = planes.reduce((sum, { fixed }) => sum + (fixed?.mass ?? 0), 0)
  for (const bay of bays) {
    const here = throws.filter(({ axial }) => own(axial) === bay)
    const levers = planes.map((plane, i) => ({
      plane,
      i,
      place: plane.axial - train.referenceAxial,
      radius: plane.radius,
    }))
    const inBay = levers.filter(({ plane }) => own(plane.axial) === bay)
    const left = demand(
      here,
      inBay.filter(({ plane }) => plane.fixed).map(({ plane }) => ({ ...plane.fixed!, ...plane })),
      train,
    )
    if (left.force === nothing && left.couple === nothing) continue
    const free = inBay.filter(({ plane }) => !plane.fixed)
    const refuse = (reason: CannotBalance['reason']) =>
      new CannotBalance(
        reason,
        phasor(left.force).size,
        phasor(left.couple).size,
        rule === 'bay' ? here.map(({ id }) => id) : undefined,
      )
    if (free.length === 0) throw refuse('no-plane')
    const light = leastMass(
      free.map(({ plane, ...lever }) => ({ ...lever, most: rule === 'even' ? undefined : plane.most })),
      left.force,
      left.couple,
    )
    if (!light.balances)
      throw refuse(new Set(free.map(({ place }) => place)).size === 1 ? 'one-place' : 'full')
    least += light.bound
    const [at, slope] = leastSquares(free, left.force, left.couple)
    free.forEach(({ i, radius, place }, k) => {
      masses[i] = rule === 'even' ? scaled(plus(at, scaled(slope, place)), radius) : light.masses[k]
    })
  }
  const counterweights = planes.map(({ id, axial, radius }, i) => {
    const { size, angle } = phasor(masses[i])
    return { id, axial, radius, mass: size, angle }
  })
  return { counterweights, mass: counterweights.reduce((sum, { mass }) => sum + mass, 0), least }
}

/** Each throw with its bob-weight. */
const throwUnbalances = (train: Train) =>
  hungUnbalances(train).map(({ angle, axial, unbalance }, index) => ({
    id: train.throws[index].id,
    angle,
    axial,
    unbalance: unbalance + train.throws[index].unbalance,
  }))

/** How many mains lie before a place: the same between two neighbours. */
const bayOf = ({ mains }: Train, place: number) => mains.filter(({ axial }) => axial < place).length

/** What counterweights have to answer; nothing where it is rounding. */
function demand(
  throws: { angle: number; axial: number; unbalance: number }[],
  fixed: { angle: number; axial: number; mass: number; radius: number }[],
  { referenceAxial }: Train,
): Pick<Demand, 'force' | 'couple'> {
  const all = [...throws, ...fixed.map((weight) => ({ ...weight, unbalance: weight.mass * weight.radius }))]
  const sum = all.reduce<Demand & { arms: number }>(
    (at, { angle, axial, unbalance }) => {
      const one = complex({ size: unbalance, angle })
      const arm = axial - referenceAxial
      return {
        force: minus(at.force, one),
        couple: minus(at.couple, scaled(one, arm)),
        whole: at.whole + Math.abs(unbalance),
        arms: at.arms + Math.abs(arm * unbalance),
      }
    },
    { force: nothing, couple: nothing, whole: 0, arms: 0 },
  )
  const clear = (value: Complex, whole: number) => (phasor(value).size <= ROUNDING * whole ? nothing : value)
  return { force: clear(sum.force, sum.whole), couple: clear(sum.couple, sum.arms) }
}
