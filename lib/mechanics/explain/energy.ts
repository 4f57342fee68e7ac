import { DEGREES } from '../analysis/recorder'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { sampledEachDegree, steady } from './words'

/** Running sum of torque less its mean over the cycle, J: its least and greatest, and where. Torque linear between samples. */
function swing(signal: Float64Array, cycle: number) {
  const step = cycle / signal.length
  const mean = signal.reduce((sum, each) => sum + each, 0) / signal.length
  let energy = 0
  const out = { least: { at: 0, energy: 0 }, greatest: { at: 0, energy: 0 } }
  const note = (at: number, value: number) => {
    if (value < out.least.energy) out.least = { at, energy: value }
    if (value > out.greatest.energy) out.greatest = { at, energy: value }
  }
  signal.forEach((value, i) => {
    const here = value - mean
    const next = signal[(i + 1) % signal.length] - mean
    if (here * next < 0)
      note((i + here / (here - next)) * step, energy + (step * here * here) / (2 * (here - next)))
    energy += (step * (here + next)) / 2
    note((i + 1) * step, energy)
  })
  return out
}

export function energyFluctuation(engine: Engine): Draft {
  const { least, greatest } = swing(engine.cycle().torque, engine.train.cycle)
  const at = (angle: number) => `${Math.round(angle * DEGREES)}°`
  return {
    title: 'Energy to and fro',
    quantity: 'energy',
    unit: 'J',
    formula: 'greatest − least',
    symbols: [
      symbol(
        'greatest',
        `sum of (moment − mean) over the angle, at ${at(greatest.at)}`,
        greatest.energy,
        'J',
      ),
      symbol('least', `the same, at ${at(least.at)}`, least.energy, 'J'),
    ],
    assumptions: ['The load takes the mean turning moment at every angle.', sampledEachDegree, steady],
    source: 'Turning-moment diagram method of machine-dynamics handbooks (common practice).',
  }
}

/** Flywheel inertia for a wanted coefficient of speed fluctuation (greatest − least speed, over the mean). */
export function flywheel(engine: Engine): Draft {
  const { asked, plan, train } = engine
  const energy = evaluateEnergy(engine)
  const own = train.inertia.flywheel + train.inertia.freeEnd
  const wanted =
    asked.fluctuation ?? (own > 0 && plan.speed > 0 ? energy / (own * plan.speed ** 2) : undefined)
  if (plan.speed === 0) throw new RangeError('A crank that stands still needs no flywheel.')
  if (wanted === undefined)
    throw new RangeError('Neither a flywheel nor a wanted speed fluctuation is given.')
  return {
    title: 'Flywheel',
    quantity: 'inertia',
    unit: 'kg m²',
    formula: 'energy / (fluctuation × speed²)',
    symbols: [
      symbol('energy', 'energy to and fro', energy, 'J'),
      symbol('fluctuation', 'greatest less least speed, over the mean', wanted),
      symbol('speed', 'crank speed', plan.speed, 'rad/s'),
    ],
    assumptions: [
      'All of the inertia turns with the crank as one piece.',
      'The turning moment is that of constant speed; small fluctuations only.',
    ],
    source: 'Turning-moment diagram method of machine-dynamics handbooks (common practice).',
  }
}

const evaluateEnergy = (engine: Engine) => {
  const { least, greatest } = swing(engine.cycle().torque, engine.train.cycle)
  return greatest.energy - least.energy
}

/** Coefficient of speed fluctuation with the train's own flywheel, or one that is asked about. */
export function speedFluctuation(engine: Engine): Draft {
  const { plan, train, asked } = engine
  const own = asked.inertiaKgM2 ?? train.inertia.flywheel + train.inertia.freeEnd
  if (!(own > 0) || plan.speed === 0) throw new RangeError('A flywheel and a speed above 0 are needed.')
  return {
    title: 'Speed fluctuation',
    quantity: 'ratio',
    unit: '',
    formula: 'energy / (inertia × speed²)',
    symbols: [
      symbol('energy', 'energy to and fro', evaluateEnergy(engine), 'J'),
      symbol('inertia', 'flywheel and free end', own, 'kg m²'),
      symbol('speed', 'crank speed', plan.speed, 'rad/s'),
    ],
    assumptions: ['Greatest less least speed, over the mean.', 'Crank and rods add no inertia of their own.'],
    source: 'Turning-moment diagram method of machine-dynamics handbooks (common practice).',
  }
}
