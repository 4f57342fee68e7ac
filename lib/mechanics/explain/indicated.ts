import { indicated } from '../indicated'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { handbook, massless } from './words'

/** Net indicated mean effective pressure: the work of a cycle over the swept volume. */
export function imep({ plan }: Engine): Draft {
  const { cylinders } = indicated(plan)
  const sum = (values: number[]) => values.reduce((total, value) => total + value, 0)
  return {
    title: 'Indicated mean effective pressure, net',
    quantity: 'pressure',
    unit: 'bar',
    formula: 'work / swept / 100000',
    symbols: [
      symbol(
        'work',
        'of the gas on the pistons over one cycle',
        sum(cylinders.map((one) => one.netWork)),
        'J',
      ),
      symbol('swept', 'swept volume of all cylinders', sum(cylinders.map((one) => one.swept)), 'm³'),
    ],
    assumptions: ['Net: with the work of gas exchange. Mean of all cylinders.', massless],
    source: handbook,
  }
}

export function indicatedPower({ plan, train }: Engine): Draft {
  const work = indicated(plan).cylinders.reduce((total, { netWork }) => total + netWork, 0)
  return {
    title: 'Indicated power',
    quantity: 'ratio',
    unit: '',
    formula: 'work × speed / cycle / 1000',
    symbols: [
      symbol('work', 'of the gas on the pistons over one cycle', work, 'J'),
      symbol('speed', 'crank speed', plan.speed, 'rad/s'),
      symbol('cycle', 'crank angle of one working cycle', train.cycle, 'rad'),
    ],
    assumptions: ['In kW. Nothing is taken off for friction or what the engine drives.'],
    source: handbook,
  }
}
