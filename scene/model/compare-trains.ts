import { analyse, type Analysis } from '@/lib/mechanics/analysis'
import type { Order } from '@/lib/mechanics/analysis/orders'
import { massSplit } from '@/lib/mechanics/balance'
import type { Train } from '@/lib/mechanics/train'
import { formatQuantity, quantityText } from '@/lib/units/format'
import { scaleFor, type Quantity, type System } from '@/lib/units/quantities'
import { toSi } from '@/lib/units/units'
import type { CrankTrain } from './crank-train'
import { intervalsInWords, layoutInWords } from './summary'
import { toTrain } from './to-train'

/** One engine at one speed. */
export interface Compared {
  document: CrankTrain
  speedRpm: number
}

/** What is compared: a figure in SI or words for each engine, null where it has none. */
export interface CompareRow {
  name: string
  quantity?: Quantity
  values: (number | string | null)[]
}

export interface CompareGroup {
  title: string
  rows: CompareRow[]
}

/** A row as it is shown: all its figures in one unit. */
export interface DifferenceRow extends CompareRow {
  unit: string
  texts: string[]
}

export interface DifferenceGroup {
  title: string
  rows: DifferenceRow[]
}

type Value = number | string | null
type Line = [name: string, quantity: Quantity | undefined, value: Value]
type Full = Required<Analysis>

/** A force or moment below this share of one cylinder's primary inertia force is rounding. */
const ROUNDING = 1e-9

/** Everything that tells engines apart, in groups, the same rows for each. Exact figures; nothing is judged better. */
export function compareTrains(compared: readonly Compared[]): CompareGroup[] {
  const sheets = compared.map(sheetOf)
  const titles = sheets[0]?.map(({ title }) => title) ?? []
  return titles.map((title, group) => {
    const names = [...new Set(sheets.flatMap((sheet) => sheet[group].lines.map(([name]) => name)))]
    const rows = names.map((name): CompareRow => {
      const lines = sheets.map((sheet) => sheet[group].lines.find(([line]) => line === name))
      const quantity = lines.find((line) => line !== undefined)?.[1]
      return { name, quantity, values: lines.map((line) => line?.[2] ?? null) }
    })
    return { title, rows }
  })
}

/** Only what differs beyond the precision it is shown in. */
export function differences(groups: readonly CompareGroup[], system: System): DifferenceGroup[] {
  return groups
    .map(({ title, rows }) => ({
      title,
      rows: rows.map((row) => shown(row, system)).filter(({ texts }) => new Set(texts).size > 1),
    }))
    .filter(({ rows }) => rows.length > 0)
}

function shown(row: CompareRow, system: System): DifferenceRow {
  const { quantity, values } = row
  const numbers = values.filter((value) => typeof value === 'number')
  const most = Math.max(0, ...numbers.map(Math.abs))
  const scale = quantity && scaleFor(most, quantity, system)
  const texts = values.map((value) => {
    if (value === null) return '–'
    if (typeof value === 'string') return value
    return quantity ? formatQuantity(value, quantity, system, undefined, scale).text : String(value)
  })
  return { ...row, unit: scale?.unit ?? '', texts }
}

function sheetOf({ document, speedRpm }: Compared): { title: string; lines: Line[] }[] {
  const train = toTrain(document)
  const speed = toSi(speedRpm, 'rpm')
  const analysis = analyse(train, { speed }) as Full
  return [
    { title: 'Layout', lines: layout(document, train) },
    { title: 'Size', lines: size(document, train, analysis) },
    { title: 'Motion', lines: motion(train, analysis, speed) },
    { title: 'Firing', lines: firing(analysis) },
    { title: 'Masses', lines: masses(document, train, analysis) },
    { title: 'Shaking', lines: shaking(train, analysis, speed) },
    { title: 'Counterweights', lines: counterweights(train) },
    { title: 'Turning moment', lines: torque(analysis) },
    { title: 'Loads', lines: loads(analysis) },
  ]
}

const degrees = (value: number) => quantityText(toSi(value, '°'), 'angle', 'si').replace(/\.0°$/, '°')

function layout(document: CrankTrain, train: Train): Line[] {
  const leads = train.throws.map(({ angle }) => {
    const from = ((angle - train.throws[0].angle) * 180) / Math.PI
    return degrees(((from % 360) + 360) % 360).replace('°', '')
  })
  return [
    ['Layout', undefined, layoutInWords(document)],
    ['Cycle', undefined, document.cycle],
    ['Rotation from the free end', undefined, document.rotation],
    ['Crank pins from the first', undefined, `${leads.join('-')}°`],
    ['Firing order', undefined, document.firingOrder.join('-')],
    ['Main bearings', 'count', train.mains.length],
    ['Balance shafts', 'count', train.balanceShafts.length],
  ]
}

/** The value all share, or the least and the greatest apart. */
function spread(name: string, quantity: Quantity, values: number[]): Line[] {
  const [least, greatest] = [Math.min(...values), Math.max(...values)]
  if (greatest - least <= 1e-12 * Math.abs(greatest)) return [[name, quantity, greatest]]
  return [
    [`${name}, least`, quantity, least],
    [`${name}, greatest`, quantity, greatest],
  ]
}

const size = (_document: CrankTrain, train: Train, { train: summary }: Full): Line[] => [
  ['Swept volume', 'volume', summary.displacementCc / 1e6],
  ...spread(
    'Bore',
    'length',
    train.cylinders.map(({ bore }) => bore),
  ),
  ...spread(
    'Stroke',
    'length',
    train.cylinders.map((cylinder) => 2 * train.throws[cylinder.throw].radius),
  ),
  ...spread(
    'Rod length',
    'length',
    train.cylinders.map(({ rodLength }) => rodLength),
  ),
  ...spread(
    'Throw radius to rod length',
    'ratio',
    train.cylinders.map((cylinder) => train.throws[cylinder.throw].radius / cylinder.rodLength),
  ),
  ...spread(
    'Offset',
    'length',
    train.cylinders.map(({ offset }) => offset),
  ),
  ...spread(
    'Compression ratio',
    'ratio',
    train.cylinders.map(({ compressionRatio }) => compressionRatio),
  ),
  ['Length between outer cylinders', 'length', reach(train.cylinders.map(({ axial }) => axial))],
]

const reach = (places: number[]) => Math.max(...places) - Math.min(...places)
const peak = (...signals: number[][]) =>
  signals[0].reduce((most, _, i) => Math.max(most, Math.hypot(...signals.map((signal) => signal[i]))), 0)

function motion(_train: Train, { train, kinematics }: Full, speed: number): Line[] {
  const cylinders = Object.values(kinematics)
  return [
    ['Speed', 'speed', speed],
    ['Mean piston speed', 'velocity', train.meanPistonSpeedMS],
    ['Piston speed, most', 'velocity', Math.max(...cylinders.map(({ velocityMS }) => peak(velocityMS)))],
    [
      'Piston acceleration, most',
      'acceleration',
      Math.max(...cylinders.map((each) => peak(each.accelerationMS2))),
    ],
  ]
}

function firing({ firing: answer }: Full): Line[] {
  const { banks, collectors } = answer
  const words = ({ intervalsDeg, even }: { intervalsDeg: number[]; even: boolean }) => {
    const text = intervalsInWords(intervalsDeg, even)
    return even && intervalsDeg.length > 1 ? `${text}, ${intervalsDeg.length} times` : text
  }
  const used = Object.entries(banks).filter(([, { intervalsDeg }]) => intervalsDeg.length > 0)
  const group = (kind: string, entries: typeof used): Line[] =>
    entries.map(([id, intervals]) => [`${kind} ${id}`, undefined, words(intervals)])
  return [
    ['Intervals', undefined, words(answer)],
    ...(used.length > 1 ? group('Bank', used) : []),
    ...(used.length > 1
      ? ([['Banks take turns', undefined, answer.alternatesBanks ? 'yes' : 'no']] satisfies Line[])
      : []),
    ...group('Collector', Object.entries(collectors)),
  ]
}

function masses(document: CrankTrain, train: Train, { balance }: Full): Line[] {
  const splits = train.cylinders.map(massSplit)
  return [
    ...spread(
      'Reciprocating a cylinder',
      'mass',
      splits.map(({ reciprocating }) => reciprocating),
    ),
    ...spread(
      'Rotating with the rod',
      'mass',
      splits.map(({ rotating }) => rotating),
    ),
    ['Balance factor', 'share', train.balanceFactor],
    ...spread(
      'Bob-weight',
      'mass',
      Object.values(balance.bobWeights).map(({ kg }) => kg),
    ),
    ['Crank', 'mass', document.crankMassKg ?? null],
  ]
}

function shaking(train: Train, { orders, shaking: signals, balance }: Full, speed: number): Line[] {
  const primary = Math.max(
    ...train.cylinders.map(
      (each) => massSplit(each).reciprocating * train.throws[each.throw].radius * speed ** 2,
    ),
  )
  const length = Math.max(reach(train.cylinders.map(({ axial }) => axial)), train.cylinders[0].bore)
  const force = (value: number) => (value < ROUNDING * primary ? 0 : value)
  const couple = (value: number) => (value < ROUNDING * primary * length ? 0 : value)
  const ofOrder = (order: Order, name: string): Line[] => [
    [`${name}, vertical`, 'force', force(order.vertical.amplitudeN)],
    [`${name}, horizontal`, 'force', force(order.horizontal.amplitudeN)],
    [`${name}, forward`, 'force', force(order.forwardN)],
    [`${name}, backward`, 'force', force(order.backwardN)],
    [`${name}, couple forward`, 'torque', couple(order.forwardNm)],
    [`${name}, couple backward`, 'torque', couple(order.backwardNm)],
  ]
  const named = { 1: 'First order', 2: 'Second order', 4: 'Fourth order' } as const
  return [
    ['Force, at most', 'force', force(peak(signals.verticalN, signals.horizontalN))],
    ['Couple, at most', 'torque', couple(peak(signals.coupleVerticalNm, signals.coupleHorizontalNm))],
    ...orders.flatMap((order) =>
      order.order === 1 || order.order === 2 || order.order === 4 ? ofOrder(order, named[order.order]) : [],
    ),
    ['Residual of crank and bob-weights', 'unbalance', toSi(balance.residual.staticKgMm, 'kg mm')],
    ['Residual couple', 'coupleUnbalance', toSi(balance.residual.coupleKgMm2, 'kg mm²')],
  ]
}

function counterweights({ counterweights: weights }: Train): Line[] {
  const moments = weights.map(({ mass, radius }) => mass * radius)
  const sum = (values: number[]) => values.reduce((whole, value) => whole + value, 0)
  const count: Line = ['Counterweights', 'count', weights.length]
  if (weights.length === 0) return [count]
  return [
    count,
    ['Heaviest, mass × radius', 'unbalance', Math.max(...moments)],
    ['Mass of all', 'mass', sum(weights.map(({ mass }) => mass))],
  ]
}

const torque = ({ torque: answer }: Full): Line[] => [
  ['Mean', 'torque', answer.meanNm],
  ['Most', 'torque', answer.peakNm],
  ['Energy fluctuation', 'energy', answer.energyFluctuationJ],
]

function loads({ loads: cylinders, mains, gas }: Full): Line[] {
  const all = Object.values(cylinders)
  const bearings = Object.values(mains)
  const most = (values: number[]) => (values.length > 0 ? Math.max(...values) : null)
  return [
    [
      'Cylinder pressure, most',
      'pressure',
      most(Object.values(gas).map(({ pressureBar }) => toSi(peak(pressureBar), 'bar'))),
    ],
    ['Gas force, most', 'force', most(all.map(({ gasForceN }) => peak(gasForceN)))],
    ['Side thrust, most', 'force', most(all.map(({ sideThrustN }) => peak(sideThrustN)))],
    [
      'Crank pin, most',
      'force',
      most(
        all.flatMap(({ crankPinN }) => (crankPinN ? [peak(crankPinN.vertical, crankPinN.horizontal)] : [])),
      ),
    ],
    ['Main bearing, most', 'force', most(bearings.map(({ peakN }) => peakN))],
    ['Main bearing, greatest mean', 'force', most(bearings.map(({ meanN }) => meanN))],
  ]
}
