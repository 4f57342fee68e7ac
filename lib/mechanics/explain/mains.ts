import { buildInstant, fillInstant } from '../plan'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { size } from './sizes'
import { handbook, hinged, newton, sampledEachDegree, steady } from './words'

const MM = 1000

const mainOf = (engine: Engine) => {
  const { train, asked } = engine
  const index = asked.main === undefined ? -1 : train.mains.findIndex(({ id }) => id === asked.main)
  if (train.mains.length < 2) throw new RangeError('Fewer than two mains are described.')
  if (asked.main !== undefined && index < 0) throw new RangeError(`There is no main “${asked.main}”.`)
  const signals = engine.cycle().mains
  const peaks = signals.map((signal) => signal.reduce((most, value) => Math.max(most, value), 0))
  const chosen = index < 0 ? peaks.indexOf(Math.max(...peaks)) : index
  return { id: train.mains[chosen].id, signal: signals[chosen], peak: peaks[chosen] }
}

/** The greatest load of one main; of the most loaded one where none is named. */
export function mainPeak(engine: Engine): Draft {
  const { id, signal, peak } = mainOf(engine)
  const at = signal.indexOf(peak)
  const parts = momentOf(engine, at)
  const main = engine.train.mains.findIndex((each) => each.id === id)
  return {
    title: `Most on main ${id}, at ${at}°`,
    quantity: 'force',
    unit: 'N',
    formula: 'root((rods up + crank up)² + (rods aside + crank aside)²)',
    symbols: [
      symbol('rods up', 'share of the rods’ pin loads, vertical', parts.rods.vertical[main], 'N'),
      symbol('crank up', 'share of throws and counterweights, vertical', parts.crank.vertical[main], 'N'),
      symbol('rods aside', 'share of the rods’ pin loads, horizontal', parts.rods.horizontal[main], 'N'),
      symbol(
        'crank aside',
        'share of throws and counterweights, horizontal',
        parts.crank.horizontal[main],
        'N',
      ),
    ],
    assumptions: [hinged, sampledEachDegree, steady],
    source: newton,
  }
}

function momentOf({ plan }: Engine, degree: number) {
  const { mainVertical, mainHorizontal } = plan.unbalance
  const theta = (degree * Math.PI) / 180
  const [cos, sin] = [Math.cos(theta), Math.sin(theta)]
  const square = plan.speed ** 2
  const crank = {
    vertical: Array.from(mainVertical, (v, k) => square * (v * cos - mainHorizontal[k] * sin)),
    horizontal: Array.from(mainVertical, (v, k) => square * (v * sin + mainHorizontal[k] * cos)),
  }
  return { crank, rods: rodsOnMains(plan, theta) }
}

function rodsOnMains(plan: Engine['plan'], theta: number) {
  const out = { vertical: plan.train.mains.map(() => 0), horizontal: plan.train.mains.map(() => 0) }
  const instant = buildInstant(plan)
  fillInstant(instant, plan, theta)
  plan.carriedBy.forEach(({ first, share }, i) => {
    if (plan.paths[i].master >= 0) return
    for (const [main, part] of [
      [first, 1 - share],
      [first + 1, share],
    ]) {
      out.vertical[main] += part * instant.crankPinVertical[i]
      out.horizontal[main] += part * instant.crankPinHorizontal[i]
    }
  })
  return out
}

export function mainMean(engine: Engine): Draft {
  const { id, signal } = mainOf(engine)
  return {
    title: `Mean on main ${id}`,
    quantity: 'force',
    unit: 'N',
    formula: 'sum / samples',
    symbols: [
      symbol(
        'sum',
        'of the load’s size at every degree',
        signal.reduce((sum, value) => sum + value, 0),
        'N',
      ),
      symbol('samples', 'degrees of the cycle', signal.length),
    ],
    assumptions: [hinged, sampledEachDegree, steady],
    source: handbook,
  }
}

/** The greatest load of a main on the area it projects. */
export function specificLoad(engine: Engine): Draft {
  const { id, peak } = mainOf(engine)
  return {
    title: `Specific load of main ${id}`,
    quantity: 'stress',
    unit: 'MPa',
    formula: 'load / (diameter × length)',
    symbols: [
      symbol('load', `the most on main ${id}`, peak, 'N'),
      symbol('diameter', 'main journal diameter', size(engine, 'mainDia', 'main diameter') * MM, 'mm'),
      symbol('length', 'main journal length', size(engine, 'mainLength', 'main length') * MM, 'mm'),
    ],
    assumptions: ['The load is spread evenly over the projected area; no oil film is worked out.', hinged],
    source: handbook,
  }
}

/** The rod's greatest load on its pin over the area it projects. */
export function pinSpecificLoad(engine: Engine): Draft {
  const { plan, cylinder, train } = engine
  const instant = buildInstant(plan)
  const rods = train.cylinders.filter(
    (one) => one.throw === train.cylinders[cylinder].throw && !one.link,
  ).length
  let [peak, at] = [0, 0]
  for (let degree = 0; degree < Math.round((train.cycle * 180) / Math.PI); degree++) {
    fillInstant(instant, plan, (degree * Math.PI) / 180)
    const load = Math.hypot(instant.crankPinVertical[cylinder], instant.crankPinHorizontal[cylinder])
    if (load > peak) [peak, at] = [load, degree]
  }
  return {
    title: 'Specific load of the crank pin',
    quantity: 'stress',
    unit: 'MPa',
    formula: 'load × rods / (diameter × length)',
    symbols: [
      symbol('load', `the most that the rod puts on its pin, at ${at}°`, peak, 'N'),
      symbol('rods', 'rods side by side on the pin', rods),
      symbol('diameter', 'crank pin diameter', size(engine, 'pinDia', 'crank pin diameter') * MM, 'mm'),
      symbol('length', 'crank pin length', size(engine, 'pinLength', 'crank pin length') * MM, 'mm'),
    ],
    assumptions: [
      'The load is spread evenly over the projected area; no oil film is worked out.',
      sampledEachDegree,
    ],
    source: handbook,
  }
}
