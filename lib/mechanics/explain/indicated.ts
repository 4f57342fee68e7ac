import { indicated } from '../indicated'
import { pistonHeight } from '../link-rod'
import { DEGREES } from '../analysis/recorder'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { handbook, massless } from './words'

const BAR = 1e5

/** Of the cylinder that is named, else of them all. */
function cylindersOf({ plan, asked, cylinder }: Engine) {
  const { cylinders } = indicated(plan)
  return asked.cylinder === undefined
    ? { list: cylinders, of: 'all cylinders' }
    : { list: [cylinders[cylinder]], of: `cylinder ${asked.cylinder}` }
}

const sum = (values: number[]) => values.reduce((total, value) => total + value, 0)

/** Indicated mean effective pressure: the work of a cycle over the swept volume. */
function meanPressure(engine: Engine, kind: 'net' | 'gross'): Draft {
  const { list, of } = cylindersOf(engine)
  const work = sum(list.map((one) => (kind === 'net' ? one.netWork : one.grossWork)))
  return {
    title: `Indicated mean effective pressure, ${kind}`,
    quantity: 'pressure',
    unit: 'bar',
    formula: 'work / swept / 100000',
    symbols: [
      symbol(
        'work',
        kind === 'net' ? 'of the gas on the pistons over one cycle' : 'of compression and expansion alone',
        work,
        'J',
      ),
      symbol('swept', `swept volume of ${of}`, sum(list.map((one) => one.swept)), 'm³'),
    ],
    assumptions: [
      kind === 'net'
        ? 'Net: with the work of gas exchange.'
        : 'Gross: from bottom to bottom dead centre about firing, without gas exchange; on a two-stroke it is the net one.',
      massless,
    ],
    source: 'J. B. Heywood, Internal Combustion Engine Fundamentals, 1988, section 2.6.',
  }
}

export const imep = (engine: Engine) => meanPressure(engine, 'net')
export const imepGross = (engine: Engine) => meanPressure(engine, 'gross')

export function indicatedPower(engine: Engine): Draft {
  const { list, of } = cylindersOf(engine)
  return {
    title: 'Indicated power',
    quantity: 'power',
    unit: 'kW',
    formula: 'work × speed / cycle / 1000',
    symbols: [
      symbol('work', `of the gas in ${of} over one cycle`, sum(list.map((one) => one.netWork)), 'J'),
      symbol('speed', 'crank speed', engine.plan.speed, 'rad/s'),
      symbol('cycle', 'crank angle of one working cycle', engine.train.cycle, 'rad'),
    ],
    assumptions: ['Nothing is taken off for friction or what the engine drives.'],
    source: handbook,
  }
}

/** Compression as if nothing burned, and what the heat adds; a trace has no formula for its highest point. */
export function peakPressure({ plan, train, cylinder }: Engine): Draft {
  const { peakPressure: peak, peakAngle } = indicated(plan).cylinders[cylinder]
  const { gas, chambers, paths, fires } = plan
  const side = peakAngle < 0 ? 'before' : 'after'
  const at = `${Number(Math.abs(peakAngle * DEGREES).toFixed(1))}° ${side} firing top dead centre`
  const told = {
    title: `Peak pressure in cylinder ${train.cylinders[cylinder].id}, ${at}`,
    quantity: 'pressure' as const,
    unit: 'bar' as const,
  }
  const closed =
    gas.model === 'heat-release' && peakAngle >= gas.gas.intakeCloses && peakAngle <= gas.gas.exhaustOpens
  if (!closed)
    return {
      ...told,
      formula: 'highest',
      symbols: [symbol('highest', 'greatest pressure of the cycle, absolute', peak / BAR, 'bar')],
      assumptions: [
        gas.model === 'trace'
          ? 'The pressure is read off the given trace, linear between its points.'
          : gas.model === 'none'
            ? 'No gas model is given: the pressure is the crankcase’s.'
            : 'The highest pressure stands while the valves are open.',
      ],
      source: handbook,
    }
  const { area, clearance, topHeight } = chambers[cylinder]
  const travel = topHeight - pistonHeight(paths, cylinder, fires[cylinder] + peakAngle)
  const compressed = gas.tables[cylinder].base / Math.pow(clearance + area * travel, gas.gas.gamma)
  return {
    ...told,
    formula: 'compressed + heated',
    symbols: [
      symbol(
        'compressed',
        'pressure there if nothing had burned, by p·V^gamma constant',
        compressed / BAR,
        'bar',
      ),
      symbol('heated', 'what the heat released until there adds to it', (peak - compressed) / BAR, 'bar'),
    ],
    assumptions: ['A single-zone estimate: one gas of constant gamma, no heat lost to the walls.'],
    source:
      'J. B. Heywood, Internal Combustion Engine Fundamentals, 1988: single-zone heat release with a Wiebe function.',
  }
}
