import { firingEvents, firingOf, type FiringIntervals } from '../firing'
import type { Plan } from '../instant'
import { byId, DEGREES } from './recorder'

export interface IntervalsDeg {
  intervalsDeg: number[]
  even: boolean
}

export interface FiringAnswer extends IntervalsDeg {
  events: { cylinder: string; angleDeg: number }[]
  banks: Record<string, IntervalsDeg>
  collectors: Record<string, IntervalsDeg>
  alternatesBanks: boolean
}

export function firingAnswer({ train, fires }: Plan): FiringAnswer {
  const firing = firingOf(train, firingEvents(train, Array.from(fires)))
  const inDegrees = ({ intervals, even }: FiringIntervals): IntervalsDeg => ({
    intervalsDeg: intervals.map((interval) => interval * DEGREES),
    even,
  })
  return {
    events: firing.events.map(({ cylinder, angle }) => ({
      cylinder: train.cylinders[cylinder].id,
      angleDeg: angle * DEGREES,
    })),
    ...inDegrees(firing),
    banks: byId(train.banks, (_, index) => inDegrees(firing.banks[index])),
    collectors: byId(train.collectors, (_, index) => inDegrees(firing.collectors[index])),
    alternatesBanks: firing.alternatesBanks,
  }
}
