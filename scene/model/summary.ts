import { analyse } from '@/lib/mechanics/analysis'
import { formatNumber, formatQuantity, quantityText } from '@/lib/units/format'
import type { Quantity } from '@/lib/units/quantities'
import type { Scene } from './scene'
import { toTrain } from './to-train'

export interface SummaryRow {
  name: string
  si: { text: string; unit: string }
  us: { text: string; unit: string }
}

export interface TrainSummary {
  /** What it is: "8 cylinders in 2 banks at 90°". */
  layout: string
  /** What stands on the drawing, for whoever does not see it. */
  sentence: string
  tables: { title: string; rows: SummaryRow[] }[]
}

const rpm = (2 * Math.PI) / 60

const both = (name: string, value: number, quantity: Quantity): SummaryRow => ({
  name,
  si: formatQuantity(value, quantity, 'si'),
  us: formatQuantity(value, quantity, 'us'),
})

const largest = (xs: number[], ys: number[]) =>
  xs.reduce((most, x, index) => Math.max(most, Math.hypot(x, ys[index])), 0)

const degrees = (value: number) => `${formatNumber(value, { decimals: 1 }).replace(/\.0$/, '')}°`

export function intervalsInWords(intervalsDeg: number[], even: boolean): string {
  if (intervalsDeg.length === 1) return `once every ${degrees(intervalsDeg[0])}`
  if (even) return `every ${degrees(intervalsDeg[0])}`
  return (
    intervalsDeg.map((interval) => formatNumber(interval, { decimals: 1 }).replace(/\.0$/, '')).join('-') +
    '°'
  )
}

export function layoutInWords(train: Scene['train']): string {
  const cylinders = train.cylinders.length
  const many = cylinders === 1 ? 'One cylinder' : `${cylinders} cylinders`
  const used = train.banks.filter((bank) => train.cylinders.some((cylinder) => cylinder.bank === bank.id))
  if (used.length === 1) return cylinders === 1 ? many : `${many} in line`
  if (used.length === 2)
    return `${many} in two banks, ${degrees(Math.abs(used[1].angleDeg - used[0].angleDeg))} apart`
  return `${many} in ${used.length} banks`
}

/** A scene in figures and words for those who only look, at the speed it was saved with. Computed, never stored. */
export function summaryOf({ train: document, view }: Scene): TrainSummary {
  const train = toTrain(document)
  const answer = analyse(train, {
    speed: view.speedRpm * rpm,
    include: ['mains', 'torque', 'shaking', 'firing'],
  })
  const shaking = answer.shaking!
  const torque = answer.torque!
  const firing = answer.firing!
  const mains = Object.values(answer.mains!)
  const at = `At ${formatNumber(view.speedRpm, { decimals: 0 })} rpm`
  const shake = largest(shaking.verticalN, shaking.horizontalN)
  const layout = layoutInWords(document)
  const fires = intervalsInWords(firing.intervalsDeg, firing.even)
  const { boreMm, strokeMm } = { ...document.cylinderDefaults, ...document.cylinders[0] }
  return {
    layout,
    sentence: `${layout}, ${quantityText(answer.train.displacementCc / 1e6, 'volume', 'si')}. Fires ${
      firing.even ? fires : `at ${fires}`
    }. ${at} the shaking force is at most ${quantityText(shake, 'force', 'si')}.`,
    tables: [
      {
        title: at,
        rows: [
          both('Shaking force, at most', shake, 'force'),
          both(
            'Shaking couple, at most',
            largest(shaking.coupleVerticalNm, shaking.coupleHorizontalNm),
            'torque',
          ),
          both('Turning moment, mean', torque.meanNm, 'torque'),
          both('Turning moment, most', torque.peakNm, 'torque'),
          ...(mains.length > 0
            ? [both('Load on a main, most', Math.max(...mains.map((main) => main.peakN)), 'force')]
            : []),
          both('Mean piston speed', answer.train.meanPistonSpeedMS, 'velocity'),
        ],
      },
      {
        title: 'Size',
        rows: [
          both('Displacement', answer.train.displacementCc / 1e6, 'volume'),
          both('Bore', (boreMm ?? 0) / 1000, 'length'),
          both('Stroke', (strokeMm ?? 0) / 1000, 'length'),
        ],
      },
    ],
  }
}
