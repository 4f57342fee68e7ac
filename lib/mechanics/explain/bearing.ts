import { DEGREES } from '../analysis/recorder'
import { bearings, bearingSignal, turnedSignal, type Bearing } from '../loads/bearings'
import { cycleParts, type CycleParts } from '../loads/cycle-parts'
import { loadFigures } from '../loads/load-figures'
import { planeAt } from '../loads/part-signals'
import { leastLoadedSector, surfaceLoad } from '../loads/surface-load'
import { indexOf, type Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { size } from './sizes'
import { handbook, hinged, newton, sampledEachDegree, steady } from './words'

const MM = 1000
const spread = 'The load is spread evenly over the projected area; no oil film is worked out.'

interface Chosen {
  bearing: Bearing
  parts: CycleParts
  name: string
}

/** A main where one is named, else a throw's pin with all its rods, else the rod of the named cylinder. */
function chosen({ train, asked, cylinder, pin }: Engine): Chosen {
  const parts = cycleParts(train)
  const all = bearings(parts)
  const found = (kind: Bearing['kind'], index: number, name: string) => ({
    bearing: all.find((one) => one.kind === kind && one.index === index)!,
    parts,
    name,
  })
  if (asked.main !== undefined) {
    if (train.mains.length < 2) throw new RangeError('Fewer than two mains are described.')
    return found('main', indexOf(train.mains, asked.main, 'main'), `main ${asked.main}`)
  }
  if (asked.throw !== undefined || asked.cylinder === undefined)
    return found('pin', pin, `pin ${train.throws[pin].id}`)
  return train.cylinders[cylinder].link
    ? found('knuckle', cylinder, `the knuckle of rod ${asked.cylinder}`)
    : found('rod', cylinder, `rod ${asked.cylinder} on its pin`)
}

const assumed = ({ bearing }: Chosen) => [
  ...(bearing.kind === 'main' ? [hinged] : []),
  sampledEachDegree,
  steady,
]

const figuresOf = ({ parts, bearing }: Chosen, speed: number) =>
  loadFigures(bearingSignal(parts, bearing, 'total', speed), parts.angle)

/** Gas and inertia apart at the greatest load: each load is gas + speed² × inertia at 1 rad/s. */
export function bearingPeak(engine: Engine): Draft {
  const { speed } = engine.plan
  const one = chosen(engine)
  const { kind, index } = one.bearing
  const { peakSample, peakAngle } = figuresOf(one, speed)
  const list = ({ pin: 'pins', rod: 'rods', knuckle: 'rods', main: 'mains' } as const)[kind]
  const [gas, inertia] = [one.parts.gas[list][index], one.parts.inertia[list][index]]
  const still = planeAt(gas, inertia, 'gas', speed)
  const moving = planeAt(gas, inertia, 'inertia', speed)
  const of = (word: string, name: string, values: Float64Array) => symbol(word, name, values[peakSample], 'N')
  return {
    title: `Most on ${one.name}, at ${Math.round(peakAngle * DEGREES)}°`,
    quantity: 'force',
    unit: 'N',
    formula: 'root((gas up + inertia up)² + (gas aside + inertia aside)²)',
    symbols: [
      of('gas up', 'load by the gas alone, vertical', still.vertical),
      of('inertia up', 'load by inertia alone, vertical', moving.vertical),
      of('gas aside', 'load by the gas alone, horizontal', still.horizontal),
      of('inertia aside', 'load by inertia alone, horizontal', moving.horizontal),
    ],
    assumptions: assumed(one),
    source: newton,
  }
}

export function bearingMean(engine: Engine): Draft {
  const one = chosen(engine)
  const samples = one.parts.angle.length
  return {
    title: `Mean on ${one.name}`,
    quantity: 'force',
    unit: 'N',
    formula: 'sum / samples',
    symbols: [
      symbol(
        'sum',
        'of the load’s size at every degree',
        figuresOf(one, engine.plan.speed).mean * samples,
        'N',
      ),
      symbol('samples', 'degrees of the cycle', samples),
    ],
    assumptions: assumed(one),
    source: handbook,
  }
}

/** A load on the projected area of its bearing; the rods on one pin share its length evenly. */
function onArea(engine: Engine, which: 'peak' | 'mean'): Draft {
  const one = chosen(engine)
  const { kind } = one.bearing
  if (kind === 'knuckle') throw new RangeError('The size of a knuckle is not given.')
  const on = kind === 'main' ? 'main' : 'pin'
  const called = kind === 'main' ? 'main' : 'crank pin'
  const own = engine.train.cylinders[engine.cylinder].throw
  const rods = engine.train.cylinders.filter((each) => each.throw === own && !each.link).length
  const word = which === 'peak' ? 'most' : 'mean'
  return {
    title: `${which === 'peak' ? 'Most' : 'Mean'} on the area of ${one.name}`,
    quantity: 'stress',
    unit: 'MPa',
    formula: kind === 'rod' ? 'load × rods / (diameter × length)' : 'load / (diameter × length)',
    symbols: [
      symbol('load', `the ${word} on ${one.name}`, figuresOf(one, engine.plan.speed)[which], 'N'),
      ...(kind === 'rod' ? [symbol('rods', 'rods side by side on the pin', rods)] : []),
      symbol('diameter', `${called} diameter`, size(engine, `${on}Dia`, `${called} diameter`) * MM, 'mm'),
      symbol('length', `${called} length`, size(engine, `${on}Length`, `${called} length`) * MM, 'mm'),
    ],
    assumptions: [spread, ...assumed(one)],
    source: handbook,
  }
}

export const bearingPeakOnArea = (engine: Engine) => onArea(engine, 'peak')
export const bearingMeanOnArea = (engine: Engine) => onArea(engine, 'mean')

/** What presses on the least loaded 60° of the journal, as a share of the mean all round. */
export function leastLoaded(engine: Engine): Draft {
  const one = chosen(engine)
  const load = bearingSignal(one.parts, one.bearing, 'total', engine.plan.speed)
  const { radial, tangential } = turnedSignal(load, one.bearing.stand)
  const surface = surfaceLoad(radial, tangential, one.bearing.pressed)
  const { from, to, mean } = leastLoadedSector(surface)
  const round = surface.reduce((sum, press) => sum + press, 0) / surface.length
  if (round === 0) throw new RangeError('Nothing presses on this bearing.')
  const degrees = (angle: number) => `${Math.round(angle * DEGREES) % 360}°`
  return {
    title: `Least loaded part of ${one.name}, ${degrees(from)} to ${degrees(to)}`,
    quantity: 'share',
    unit: '%',
    formula: '100 × inside / all round',
    symbols: [
      symbol('inside', 'mean of what presses on these 60° over the cycle', mean, 'N'),
      symbol('all round', 'the same of the whole surface', round, 'N'),
    ],
    assumptions: [
      'Each load is counted by its part square to the surface; a rigid journal without an oil film.',
      'Angles run from the journal’s own 0° in the direction of rotation.',
      ...assumed(one),
    ],
    source: handbook,
  }
}
