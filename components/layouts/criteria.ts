import { formatNumber } from '@/lib/units/format'
import type { Quantity } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import type { Criterion, Figures } from '@/lib/mechanics/layouts/layout'

/** How a criterion is named, typed and shown. */
export interface CriterionWords {
  id: Criterion
  /** As a wish, as a column, in a sentence, and there when the figure is 0. */
  wish: string
  column: string
  said: string
  best: string
  unit: string
  quantity: Quantity
  decimals: number
}

export const criterionWords: readonly CriterionWords[] = [
  {
    id: 'unevenness',
    wish: 'Even firing',
    column: 'Uneven',
    said: 'unevenness',
    best: 'even firing',
    unit: '°',
    quantity: 'angle',
    decimals: 1,
  },
  {
    id: 'sameBank',
    wish: 'Banks alternate',
    column: 'Same bank',
    said: 'same bank in a row',
    best: 'alternating banks',
    unit: '',
    quantity: 'count',
    decimals: 0,
  },
  {
    id: 'secondForce',
    wish: 'No free second-order force',
    column: 'Force 2',
    said: 'second-order force',
    best: 'no free second-order force',
    unit: 'F2',
    quantity: 'ratio',
    decimals: 3,
  },
  {
    id: 'secondCouple',
    wish: 'Small second-order couple',
    column: 'Couple 2',
    said: 'second-order couple',
    best: 'no second-order couple',
    unit: 'F2 a',
    quantity: 'ratio',
    decimals: 3,
  },
  {
    id: 'firstForce',
    wish: 'No free first-order force',
    column: 'Force 1',
    said: 'first-order force',
    best: 'no free first-order force',
    unit: 'F1',
    quantity: 'ratio',
    decimals: 3,
  },
  {
    id: 'firstCouple',
    wish: 'Small first-order couple',
    column: 'Couple 1',
    said: 'first-order couple',
    best: 'no free first-order couple',
    unit: 'F1 a',
    quantity: 'ratio',
    decimals: 3,
  },
  {
    id: 'counterweight',
    wish: 'Small counterweights',
    column: 'Weight',
    said: 'largest counterweight',
    best: 'no counterweight needed',
    unit: 'm r',
    quantity: 'ratio',
    decimals: 3,
  },
  {
    id: 'nearThrow',
    wish: 'Successive firings far apart',
    column: 'Near throw',
    said: 'same or next throw in a row',
    best: 'no firing near the last one',
    unit: '',
    quantity: 'count',
    decimals: 0,
  },
]

export const wordsOf = (id: Criterion): CriterionWords => criterionWords.find((one) => one.id === id)!

/** A figure in the unit it is shown in: angles in degrees. */
export const shown = (id: Criterion, figure: number): number =>
  id === 'unevenness' ? fromSi(figure, '°') : figure

/** "5.657 F2", "0°", "2". */
export function figureText(id: Criterion, figures: Pick<Figures, Criterion>): string {
  const { unit, decimals } = wordsOf(id)
  const value = shown(id, figures[id])
  const text = formatNumber(value, { decimals: Math.abs(value - Math.round(value)) < 5e-7 ? 0 : decimals })
  return unit === '' ? text : unit === '°' ? `${text}°` : `${text}\u00a0${unit}`
}
