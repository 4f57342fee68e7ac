import { DEGREES } from '../analysis/recorder'
import type { Instant, Plan } from '../instant'
import { buildInstant, buildPlan, fillInstant } from '../plan'
import type { Train } from '../train'

/** Sizes that the motion does not need and some figures do, m. */
export interface Sizes {
  pinDia?: number
  pinLength?: number
  mainDia?: number
  mainLength?: number
  webThickness?: number
  counterweightRadius?: number
  /** Of a piston, below and above its pin. */
  skirtBelowPin?: number
  crownAbovePin?: number
  /** Over the crank axis. */
  deckHeight?: number
}

/** Which figure of a train is asked about: a moment, and one of its parts where the figure has one. */
export interface Asked {
  /** rad/s, 0 or more. */
  speed: number
  /** Crank angle, degrees; 0 where not given. */
  angleDeg?: number
  /** Ids; the first one where not given. */
  cylinder?: string
  throw?: string
  main?: string
  bank?: string
  collector?: string
  counterweight?: string
  /** Of a pair of cylinders, the second. */
  other?: string
  /** Per crank revolution; 1 where not given. */
  order?: number
  /** The crank without counterweights and balance shafts. */
  bare?: boolean
  /** Balance quality grade of ISO 21940-11, mm/s; 16 where not given. */
  gradeMmS?: number
  /** Wanted coefficient of speed fluctuation; what the train's own flywheel gives where not given. */
  fluctuation?: number
  /** Of flywheel and free end, kg m²; the train's own where not given. */
  inertiaKgM2?: number
  /** Places of two balancing planes along the crank, the asked one first; the outermost bearings where not given. */
  planeMm?: number
  otherPlaneMm?: number
  /** kg/m³; tungsten alloy where not given. */
  slugDensity?: number
  sizes?: Sizes
}

/** Signals of one cycle from samples 1° apart, as the analysis takes its sums from. SI. */
export interface Cycle {
  torque: Float64Array
  vertical: Float64Array
  horizontal: Float64Array
  coupleVertical: Float64Array
  coupleHorizontal: Float64Array
  /** Magnitudes, one signal a main. */
  mains: Float64Array[]
}

/** A train at one speed and moment, with what is asked about it found. Signals are made when they are asked for. */
export interface Engine {
  asked: Asked
  train: Train
  plan: Plan
  instant: Instant
  /** Indices. */
  cylinder: number
  pin: number
  cycle(): Cycle
}

/** Throws RangeError for a name that the train does not have. */
export function indexOf(list: readonly { id: string }[], id: string | undefined, what: string): number {
  const index = id === undefined ? 0 : list.findIndex((entry) => entry.id === id)
  if (index < 0) throw new RangeError(`There is no ${what} “${id}”.`)
  return index
}

export const withoutWeights = (train: Train): Train => ({ ...train, counterweights: [], balanceShafts: [] })

export function buildEngine(given: Train, asked: Asked): Engine {
  const train = asked.bare ? withoutWeights(given) : given
  const plan = buildPlan(train, asked.speed)
  const instant = buildInstant(plan)
  fillInstant(instant, plan, (asked.angleDeg ?? 0) / DEGREES)
  const cylinder = indexOf(train.cylinders, asked.cylinder, 'cylinder')
  const pin =
    asked.throw === undefined ? train.cylinders[cylinder].throw : indexOf(train.throws, asked.throw, 'throw')
  return { asked, train, plan, instant, cylinder, pin, cycle: () => sampled(plan) }
}

function sampled(plan: Plan): Cycle {
  const count = Math.round(plan.train.cycle * DEGREES)
  const signal = () => new Float64Array(count)
  const out: Cycle = {
    torque: signal(),
    vertical: signal(),
    horizontal: signal(),
    coupleVertical: signal(),
    coupleHorizontal: signal(),
    mains: plan.train.mains.map(signal),
  }
  const instant = buildInstant(plan)
  for (let degree = 0; degree < count; degree++) {
    fillInstant(instant, plan, degree / DEGREES)
    out.torque[degree] = instant.gasTorque + instant.inertiaTorque
    out.vertical[degree] = instant.shakingVertical
    out.horizontal[degree] = instant.shakingHorizontal
    out.coupleVertical[degree] = instant.coupleVertical
    out.coupleHorizontal[degree] = instant.coupleHorizontal
    out.mains.forEach((main, index) => {
      main[degree] = Math.hypot(instant.mainVertical[index], instant.mainHorizontal[index])
    })
  }
  return out
}
