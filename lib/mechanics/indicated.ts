import { gaussLegendre } from '@/lib/numerics/gauss-legendre'
import { leastOverPeriod } from '@/lib/numerics/least-over-period'
import { wrap, wrapCentred } from '@/lib/numerics/wrap'
import { chamberKey } from './chamber'
import { cylinderPressure } from './gas'
import type { Plan } from './instant'
import { buildRodMotion, fillRodMotion } from './rod-motion'

/** What the gas does in one cylinder over a cycle. SI; angles from firing top dead centre, −half a cycle ≤ x < half. */
export interface Indicated {
  /** ∮ p dV over the whole cycle, J, and over compression and expansion alone, dead centre to dead centre. */
  netWork: number
  grossWork: number
  /** Swept volume, m³: bore area × true travel. */
  swept: number
  peakPressure: number
  peakAngle: number
}

/** The same of the engine, with mean effective pressures (Pa) and power (W) at the plan's speed. */
export interface IndicatedEngine {
  cylinders: Indicated[]
  netPressure: number
  grossPressure: number
  power: number
}

/**
 * Indicated mean effective pressure is work over swept volume: net ∮ p dV / V over the cycle, gross the same over the
 * turn about firing top dead centre, from bottom to bottom dead centre (on a two-stroke both are one). Indicated power is
 * net work × cycles a second, W·ω/cycle. Source: J. B. Heywood, Internal Combustion Engine Fundamentals, 1988, section 2.6.
 * By Gauss–Legendre quadrature between the angles where the pressure has a kink; exact to 1e-9. Without a gas model every
 * figure but the swept volume is that of a constant pressure.
 */
export function indicated(plan: Plan): IndicatedEngine {
  const known = new Map<string, Indicated>()
  const cylinders = plan.chambers.map((chamber) => {
    const key = chamberKey(chamber)
    const one = known.get(key) ?? indicatedCylinder(plan, chamber.index)
    known.set(key, one)
    return one
  })
  const sum = (of: (one: Indicated) => number) => cylinders.reduce((total, one) => total + of(one), 0)
  const swept = sum((one) => one.swept)
  const net = sum((one) => one.netWork)
  return {
    cylinders,
    netPressure: net / swept,
    grossPressure: sum((one) => one.grossWork) / swept,
    power: (net * plan.speed) / plan.train.cycle,
  }
}

const TURN = 2 * Math.PI
/** No panel of the quadrature is wider, rad. */
const PANEL = Math.PI / 90
const rule = gaussLegendre(4)

function indicatedCylinder(plan: Plan, index: number): Indicated {
  const { topHeight, bottomHeight, bottom } = plan.centres[index]
  const { area } = plan.chambers[index]
  const pressureAt = pressureOf(plan, index)
  const half = plan.train.cycle / 2
  const after = wrap(bottom - plan.fires[index], TURN)
  const before = after - TURN
  const twoStroke = plan.train.cycle <= TURN
  const work = (from: number, to: number) =>
    kinks(plan, from, to).reduce((sum, at, i, all) => sum + (i > 0 ? pressureAt.work(all[i - 1], at) : 0), 0)
  const grossWork = twoStroke ? work(-half, half) : work(before, after)
  const netWork = twoStroke ? grossWork : work(-half, before) + grossWork + work(after, half)
  return {
    netWork,
    grossWork,
    swept: area * (topHeight - bottomHeight),
    ...peakOf(plan, pressureAt.pressure),
  }
}

/** Angles between which the pressure is smooth, `from` and `to` among them. */
function kinks({ gas, train }: Plan, from: number, to: number): number[] {
  const own =
    gas.model === 'trace'
      ? Array.from(gas.trace.angle)
      : gas.model === 'heat-release'
        ? [
            ...[gas.gas.intakeCloses, gas.gas.exhaustOpens, gas.gas.combustionStart],
            gas.gas.combustionStart + gas.gas.combustionDuration,
          ]
        : []
  // a two-stroke may burn on past its cycle's end, where it is not looked at
  const inside = own.filter((at) => at > from && at < to && Math.abs(at) <= train.cycle / 2)
  return [from, ...inside.sort((a, b) => a - b), to]
}

function pressureOf(plan: Plan, index: number) {
  const { paths, train, gas, fires } = plan
  const chamber = plan.chambers[index]
  const motion = buildRodMotion(paths.length)
  const move = (angle: number) => {
    const theta = fires[index] + angle
    const [cos, sin] = [Math.cos(theta), Math.sin(theta)]
    if (paths[index].master >= 0) fillRodMotion(motion, paths, paths[index].master, cos, sin)
    fillRodMotion(motion, paths, index, cos, sin)
  }
  const pressure = (angle: number) => {
    move(angle)
    return cylinderPressure(train, gas, chamber, fires[index] + angle, chamber.topHeight - motion.pin[index])
  }
  /** ∫ p dV between two angles with no kink between them; dV/dθ = −A·ds/dθ. */
  const work = (from: number, to: number) => {
    const panels = Math.max(1, Math.ceil((to - from) / PANEL))
    const wide = (to - from) / panels
    let sum = 0
    for (let panel = 0; panel < panels; panel++)
      for (let k = 0; k < rule.nodes.length; k++) {
        const p = pressure(from + wide * (panel + (1 + rule.nodes[k]) / 2))
        sum -= rule.weights[k] * p * motion.pin1[index]
      }
    return (sum * chamber.area * wide) / 2
  }
  return { pressure, work }
}

function peakOf({ gas, train }: Plan, pressure: (angle: number) => number) {
  if (gas.model !== 'trace') {
    const { at, value } = leastOverPeriod((angle) => -pressure(angle), train.cycle, 720)
    return { peakPressure: -value, peakAngle: wrapCentred(at, train.cycle) }
  }
  // linear between its points, so that one of them is the peak
  const { trace } = gas
  const best = trace.pressure.reduce((at, value, i) => (value > trace.pressure[at] ? i : at), 0)
  return { peakPressure: trace.pressure[best], peakAngle: wrapCentred(trace.angle[best], train.cycle) }
}
