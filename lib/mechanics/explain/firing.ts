import { DEGREES } from '../analysis/recorder'
import { firingEvents, firingOf, type FiringIntervals } from '../firing'
import { indexOf, type Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { geometry, handbook } from './words'

const firingIn = ({ plan, train }: Engine) => firingOf(train, firingEvents(train, Array.from(plan.fires)))

/** From the asked cylinder's firing to the next in the order. */
export function firingInterval(engine: Engine): Draft {
  const { events, intervals } = firingIn(engine)
  const { train, cylinder } = engine
  const place = events.findIndex((event) => event.cylinder === cylinder)
  const next = events[(place + 1) % events.length]
  const here = events[place].angle * DEGREES
  const there = next.angle * DEGREES
  const cycle = train.cycle * DEGREES
  return {
    title: `Firing interval from cylinder ${train.cylinders[cylinder].id} to ${train.cylinders[next.cylinder].id}`,
    quantity: 'angle',
    unit: '°',
    formula: 'next − this + cycle × turns',
    symbols: [
      symbol('next', `firing angle of cylinder ${train.cylinders[next.cylinder].id}`, there, '°'),
      symbol('this', `firing angle of cylinder ${train.cylinders[cylinder].id}`, here, '°'),
      symbol('cycle', 'crank angle of one working cycle', cycle, '°'),
      symbol('turns', 'cycles in between', Math.round((intervals[place] * DEGREES - there + here) / cycle)),
    ],
    assumptions: ['Every cylinder fires at its exact top dead centre.'],
    source: geometry,
  }
}

function among(engine: Engine): FiringIntervals & { of: string } {
  const { asked, train } = engine
  const firing = firingIn(engine)
  if (asked.bank !== undefined)
    return { ...firing.banks[indexOf(train.banks, asked.bank, 'bank')], of: `bank ${asked.bank}` }
  if (asked.collector !== undefined)
    return {
      ...firing.collectors[indexOf(train.collectors, asked.collector, 'collector')],
      of: `collector ${asked.collector}`,
    }
  return { ...firing, of: 'the engine' }
}

export function firingEvenness(engine: Engine): Draft {
  const { intervals, of } = among(engine)
  const degrees = intervals.map((interval) => interval * DEGREES)
  const all = degrees.map((value) => Number(value.toFixed(2))).join(', ')
  return {
    title: `Evenness of firing in ${of}`,
    quantity: 'angle',
    unit: '°',
    formula: 'longest − shortest',
    symbols: [
      symbol('longest', `longest of the intervals ${all}`, Math.max(...degrees), '°'),
      symbol('shortest', 'shortest of them', Math.min(...degrees), '°'),
    ],
    assumptions: ['Intervals within half a degree of their mean are called even.'],
    source: handbook,
  }
}
