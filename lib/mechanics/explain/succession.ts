import { firingEvents, firingOf } from '../firing'
import { intervalSpread } from '../interval-spread'
import { succession, type Succession } from '../succession'
import { DEGREES } from '../analysis/recorder'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { handbook } from './words'

const words: Record<keyof Succession, { title: string; on: string }> = {
  sameBank: { title: 'Firings in succession on one bank', on: 'on the same bank' },
  sameThrow: { title: 'Firings in succession on one throw', on: 'on the same throw' },
  adjacentThrow: { title: 'Firings in succession on neighbouring throws', on: 'on the next throw' },
}

/** Every firing with the one after it counts 1 or 0. */
function counted({ train }: Engine, kind: keyof Succession): Draft {
  const { firingOrder: order } = train
  const { title, on } = words[kind]
  const pairs = order.map((cylinder, place) => {
    const next = order[(place + 1) % order.length]
    const [one, other] = [cylinder, next].map((index) => train.cylinders[index].id)
    // a pair by itself is counted as the whole order is
    const alone = succession(
      { ...train, cylinders: [train.cylinders[cylinder], train.cylinders[next]] },
      [0, 1],
    )
    const counts = order.length > 1 ? alone[kind] / 2 : 0
    return symbol(`pair ${place + 1}`, `1 where ${other} fires after ${one} ${on}`, counts)
  })
  return {
    title,
    quantity: 'ratio',
    unit: '',
    formula: pairs.map(({ symbol: word }) => word).join(' + '),
    symbols: pairs,
    assumptions: ['Counted all the way round the cycle: the first follows the last.'],
    source: handbook,
  }
}

export const sameBank = (engine: Engine) => counted(engine, 'sameBank')
export const sameThrow = (engine: Engine) => counted(engine, 'sameThrow')
export const nextThrow = (engine: Engine) => counted(engine, 'adjacentThrow')

/** How far the intervals stand from their mean, root of the mean square. */
export function firingRms(engine: Engine): Draft {
  const { train, plan } = engine
  const { intervals } = firingOf(train, firingEvents(train, Array.from(plan.fires)))
  const parts = intervals.map((interval, place) =>
    symbol(`interval ${place + 1}`, `from firing ${place + 1} to the next`, interval * DEGREES, '°'),
  )
  return {
    title: 'Rms of the firing intervals',
    quantity: 'angle',
    unit: '°',
    formula: `root((${parts.map(({ symbol: word }) => `(${word} − mean)²`).join(' + ')}) / firings)`,
    symbols: [
      ...parts,
      symbol('mean', 'cycle over the number of firings', (train.cycle * DEGREES) / intervals.length, '°'),
      symbol('firings', 'in one cycle', intervals.length),
    ],
    assumptions: ['0 where the engine fires evenly.'],
    source: handbook,
  }
}

/** The worst spread of intervals within one collector. */
export function collectorSpread({ train, plan }: Engine): Draft {
  const { collectors } = firingOf(train, firingEvents(train, Array.from(plan.fires)))
  const spreads = collectors.map(({ intervals }) => intervalSpread(intervals).spread)
  const worst = spreads.indexOf(Math.max(...spreads))
  const degrees = worst < 0 ? [0] : collectors[worst].intervals.map((interval) => interval * DEGREES)
  const where = worst < 0 ? 'no collector is given' : `in collector ${train.collectors[worst].id}`
  return {
    title: 'Worst spread of intervals in a collector',
    quantity: 'angle',
    unit: '°',
    formula: 'longest − shortest',
    symbols: [
      symbol('longest', `longest interval between pulses, ${where}`, Math.max(...degrees), '°'),
      symbol('shortest', 'shortest of them', Math.min(...degrees), '°'),
    ],
    assumptions: ['Pulses are as far apart as the firings; the pipes’ lengths are left out.'],
    source: handbook,
  }
}
