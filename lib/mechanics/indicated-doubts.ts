import type { IndicatedEngine } from './indicated'

export interface IndicatedDoubt {
  code: string
  message: string
}

/** Common practice: what the best-fed cylinders come to, Pa. */
const MOST_MEAN = 45e5
const MOST_PEAK = 350e5
/** A peak is usually this many times the mean at least. */
const PEAK_TO_MEAN = 3

const bar = (pascal: number) => {
  const value = pascal / 1e5
  return `${value.toLocaleString('en', { maximumFractionDigits: Math.abs(value) < 100 ? 1 : 0 })} bar`
}

/** What is out of the ordinary about indicated figures: mostly a slip of units in what they came from. */
export function indicatedDoubts({
  netPressure,
  grossPressure,
  cylinders,
}: IndicatedEngine): IndicatedDoubt[] {
  const peak = Math.max(...cylinders.map(({ peakPressure }) => peakPressure))
  const doubts: IndicatedDoubt[] = []
  if (Math.max(netPressure, grossPressure) > MOST_MEAN)
    doubts.push({
      code: 'mean-pressure-high',
      message: `A mean effective pressure of ${bar(grossPressure)} is not possible here: the most is about ${bar(MOST_MEAN)}. Taken as kPa it would be ${bar(grossPressure / 100)}: check the units.`,
    })
  if (netPressure < 0)
    doubts.push({
      code: 'mean-pressure-negative',
      message: `The gas takes work from the crank: mean effective pressure ${bar(netPressure).replace('-', '−')}. Check where the trace has its firing top dead centre.`,
    })
  if (peak > MOST_PEAK)
    doubts.push({
      code: 'peak-pressure-high',
      message: `A peak of ${bar(peak)} is more than the ${bar(MOST_PEAK)} that a cylinder may hold: check the units.`,
    })
  else if (grossPressure > 0 && peak < PEAK_TO_MEAN * grossPressure)
    doubts.push({
      code: 'peak-pressure-low',
      message: `Peak pressure must be well above the mean: ${bar(peak)} at a mean of ${bar(grossPressure)}; expected ${bar(PEAK_TO_MEAN * grossPressure)} and more.`,
    })
  return doubts
}
