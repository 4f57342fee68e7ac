import { angleWord, intervalWords } from '@/components/figures/interval-words'
import type { RankedOrder } from '@/lib/mechanics/firing-ranking'
import type { FigureId } from '@/lib/mechanics/explain/explain'
import type { Train } from '@/lib/mechanics/train'
import { fromSi } from '@/lib/units/units'
import type { Cell, Table } from '@/lib/tables/table'

/** An order that begins as another does, with its intervals turned alike. */
export function turnedTo(ranked: RankedOrder, first: number): RankedOrder {
  const at = Math.max(0, ranked.order.indexOf(first))
  const turn = <T>(list: readonly T[]) => [...list.slice(at), ...list.slice(0, at)]
  return { ...ranked, order: turn(ranked.order), intervals: turn(ranked.intervals) }
}

export const namesOf = (train: Train, cylinders: readonly number[]) =>
  cylinders.map((one) => train.cylinders[one].id)

export const orderName = (train: Train, { order }: RankedOrder) => namesOf(train, order).join('-')

const degrees = (angle: number) => fromSi(angle, '°')
const EVEN_DEG = 0.5

export const intervalsOf = ({ intervals, spread }: RankedOrder) =>
  intervalWords(intervals.map(degrees), degrees(spread) <= EVEN_DEG)

/** What an order is judged by, in the sequence of the ranking. */
export const criteria: {
  id: FigureId
  name: string
  unit: string
  decimals: number
  of(ranked: RankedOrder): number
}[] = [
  { id: 'firing-evenness', name: 'Spread', unit: '°', decimals: 1, of: ({ spread }) => degrees(spread) },
  { id: 'firing-rms', name: 'Rms', unit: '°', decimals: 1, of: ({ rms }) => degrees(rms) },
  { id: 'same-bank', name: 'Same bank', unit: '', decimals: 0, of: ({ sameBank }) => sameBank },
  { id: 'same-throw', name: 'Same throw', unit: '', decimals: 0, of: ({ sameThrow }) => sameThrow },
  { id: 'next-throw', name: 'Next throw', unit: '', decimals: 0, of: ({ adjacentThrow }) => adjacentThrow },
  {
    id: 'collector-spread',
    name: 'In a collector',
    unit: '°',
    decimals: 1,
    of: ({ collectorSpread }) => degrees(collectorSpread),
  },
]

export const orderTable = (train: Train, orders: readonly RankedOrder[], present: string): Table => ({
  title: 'Firing orders that the crank allows, best first',
  columns: [
    { name: 'Order', unit: '' },
    { name: 'Intervals', unit: '' },
    ...criteria.map(({ name, unit, decimals }) => ({ name, unit, decimals })),
    { name: 'Now', unit: '' },
  ],
  rows: orders.map((ranked): Cell[] => {
    const name = orderName(train, ranked)
    return [
      name,
      intervalsOf(ranked),
      ...criteria.map(({ of }) => of(ranked)),
      name === present ? 'present' : '',
    ]
  }),
})

/** Why no order of the train can be even, where that is plain. */
export function whyNoneEven({ cylinders, cycle }: Train): string {
  const oneThrow = cylinders.every((cylinder) => cylinder.throw === cylinders[0].throw)
  if (oneThrow && cycle > 2 * Math.PI && cylinders.length > 2 && cylinders.length % 2 === 0)
    return `A four-stroke single row with ${cylinders.length} cylinders cannot fire evenly; use an odd count or accept the intervals of all orders.`
  return 'These banks and throws allow no even order. Look through all orders, or ask below for the throws that would.'
}

/** An order whose firings are bunched: they fit into one turn, and then there is a pause longer than that. */
export function bunched(ranked: RankedOrder): string | null {
  const longest = Math.max(...ranked.intervals)
  if (ranked.order.length < 3 || longest < 2 * Math.PI - 1e-6) return null
  return `All fire within one turn and then pause ${angleWord(degrees(longest))}°.`
}
