import type { Analysis } from '@/lib/mechanics/analysis'
import { massSplit } from '@/lib/mechanics/balance'
import type { Train } from '@/lib/mechanics/train'
import { formatNumber } from '@/lib/units/format'
import { toSi } from '@/lib/units/units'
import type { CrankTrain } from '@/scene/model/crank-train'
import { intervalsInWords, layoutInWords } from '@/scene/model/summary'
import { byNumber } from './crank-star'
import { figureTables, pairTable, type Pair, type SheetTable } from './figure-table'
import type { SheetUnits } from './sheet-parts'

/** What every table of the sheet is made from. */
export interface Printed {
  document: CrankTrain
  train: Train
  analysis: Required<Analysis>
  /** rad/s */
  speed: number
  units: SheetUnits
}

const peak = (one: readonly number[], other: readonly number[] = []) =>
  one.reduce((most, value, i) => Math.max(most, Math.hypot(value, other[i] ?? 0)), 0)
const mean = (one: readonly number[], other: readonly number[]) =>
  one.reduce((sum, value, i) => sum + Math.hypot(value, other[i]), 0) / one.length
const kg = (value: number) => toSi(value, 'kg mm')

export const atSpeed = (speed: number) => `at ${formatNumber((speed * 30) / Math.PI, { decimals: 0 })} rpm`

export function mainData({ document, train, analysis, speed, units }: Printed): SheetTable[] {
  const [one] = train.cylinders
  const radius = train.throws[one.throw].radius
  const { firing } = analysis
  const words: [string, string][] = [
    ['Layout', layoutInWords(document)],
    ['Working cycle', document.cycle],
    ['Rotation seen from the free end', document.rotation],
    ['Firing order', document.firingOrder.join('-')],
    ['Intervals', intervalsInWords(firing.intervalsDeg, firing.even)],
    ...Object.entries(firing.banks)
      .filter(([, { intervalsDeg }]) => intervalsDeg.length > 0 && train.banks.length > 1)
      .map(([id, each]): [string, string] => [`Bank ${id}`, intervalsInWords(each.intervalsDeg, each.even)]),
    ...Object.entries(firing.collectors).map(([id, each]): [string, string] => [
      `Collector ${id}`,
      intervalsInWords(each.intervalsDeg, each.even),
    ]),
  ]
  const pairs: Pair[] = [
    ['Swept volume', analysis.train.displacementCc / 1e6, 'volume'],
    ['Bore', one.bore, 'length'],
    ['Stroke', 2 * radius, 'length'],
    ['Rod length', one.rodLength, 'length'],
    ['Offset', one.offset, 'length'],
    ['Throw radius to rod length', radius / one.rodLength, 'ratio'],
    ['Compression ratio', one.compressionRatio, 'ratio'],
    ['Speed', speed, 'speed'],
    ...(train.operating.rated ? [['Rated speed', train.operating.rated, 'speed'] satisfies Pair] : []),
    ...(train.operating.max ? [['Greatest speed', train.operating.max, 'speed'] satisfies Pair] : []),
    ['Mean piston speed', analysis.train.meanPistonSpeedMS, 'velocity'],
  ]
  return [
    { title: 'What it is', head: ['', ''], rows: words.map((row) => [...row]) },
    pairTable(
      'Main data',
      pairs,
      units,
      train.cylinders.length > 1 ? `Sizes of cylinder ${one.id}.` : undefined,
    ),
  ]
}

export function massTable({ document, train, units }: Printed): SheetTable[] {
  const [one] = train.cylinders
  const { reciprocating, rotating } = massSplit(one)
  const pairs: Pair[] = [
    ['Piston, pin, rings and locks', one.pistonMass, 'mass'],
    ['Rod', one.rod.mass, 'mass'],
    ['Rod centre of gravity from the big end', one.rod.cgFromBigEnd, 'length'],
    ['Rod moment of inertia about it', one.rod.inertia, 'inertia'],
    ['Big-end bearing', one.bigEndBearing, 'mass'],
    ['Reciprocating, a cylinder', reciprocating, 'mass'],
    ['Rotating with the rod', rotating, 'mass'],
    ...(document.crankMassKg ? [['Crank', document.crankMassKg, 'mass'] satisfies Pair] : []),
  ]
  const rod = one.rod.rigid
    ? 'The rod is a rigid body.'
    : 'The rod is two masses at its ends: its inertia is not given.'
  return [pairTable('Masses', pairs, units, `Of cylinder ${one.id}. ${rod}`)]
}

/** Orders worth a row: what is more than a ten-thousandth of the greatest of its kind. */
export function orderTables({ analysis, speed, units }: Printed): SheetTable[] {
  const all = analysis.orders
  const most = {
    force: Math.max(...all.map((order) => Math.max(order.forwardN, order.backwardN))),
    couple: Math.max(...all.map((order) => Math.max(order.forwardNm, order.backwardNm))),
    torque: Math.max(...all.map(({ torqueNm }) => torqueNm)),
  }
  const share = 1e-4
  const shown = all.filter(
    (order) =>
      [1, 2, 4].includes(order.order) ||
      Math.max(order.forwardN, order.backwardN) > share * most.force ||
      Math.max(order.forwardNm, order.backwardNm) > share * most.couple ||
      order.torqueNm > 0.05 * most.torque,
  )
  return figureTables(
    'Orders of the shaking force, couple and turning moment',
    { name: 'Order', values: shown.map(({ order }) => formatNumber(order, { decimals: order % 1 ? 1 : 0 })) },
    [
      { name: 'Vertical', quantity: 'force', values: shown.map(({ vertical }) => vertical.amplitudeN) },
      { name: 'Horizontal', quantity: 'force', values: shown.map(({ horizontal }) => horizontal.amplitudeN) },
      { name: 'Forward', quantity: 'force', values: shown.map(({ forwardN }) => forwardN) },
      { name: 'Backward', quantity: 'force', values: shown.map(({ backwardN }) => backwardN) },
      { name: 'Couple forward', quantity: 'torque', values: shown.map(({ forwardNm }) => forwardNm) },
      { name: 'Couple backward', quantity: 'torque', values: shown.map(({ backwardNm }) => backwardNm) },
      {
        name: 'Turning moment',
        quantity: 'torque',
        values: shown.map(({ torqueNm }) => torqueNm),
        apart: true,
      },
    ],
    units,
    `${atSpeed(speed)[0].toUpperCase()}${atSpeed(speed).slice(1)}, with counterweights and balance shafts. Forward turns with the crank, backward against it.`,
  )
}

export function counterweightTables({ train, units }: Printed): SheetTable[] {
  const weights = train.counterweights
  if (weights.length === 0)
    return [{ title: 'Counterweights', head: ['', ''], rows: [['Counterweights', 'none']] }]
  return figureTables(
    'Counterweights',
    { name: 'Web', values: weights.map(({ id }) => id) },
    [
      { name: 'Place', quantity: 'length', values: weights.map(({ axial }) => axial) },
      { name: 'Angle', quantity: 'angle', values: weights.map(({ angle }) => angle) },
      { name: 'Mass', quantity: 'mass', values: weights.map(({ mass }) => mass) },
      { name: 'Radius', quantity: 'length', values: weights.map(({ radius }) => radius) },
      {
        name: 'Mass × radius',
        quantity: 'unbalance',
        values: weights.map(({ mass, radius }) => mass * radius),
      },
    ],
    units,
    'Place from the free end; angle in the crank, positive in the direction of rotation.',
  )
}

export function bobWeightTables({ train, analysis, units }: Printed): SheetTable[] {
  const { bobWeights, residual, grade } = analysis.balance
  const each = train.throws.map(({ id }) => bobWeights[id])
  const percent = formatNumber(100 * train.balanceFactor, { decimals: 1 })
  const left: Pair[] = [
    ['Residual, mass × radius', kg(residual.staticKgMm), 'unbalance'],
    ['Residual couple', toSi(residual.coupleKgMm2, 'kg mm²'), 'coupleUnbalance'],
    ...(grade
      ? [[`Permissible at G ${grade.gradeMmS}`, kg(grade.permissibleKgMm), 'unbalance'] satisfies Pair]
      : []),
  ]
  return [
    ...figureTables(
      'Bob-weights',
      { name: 'Throw', values: train.throws.map(({ id }) => id) },
      [
        {
          name: 'Reciprocating',
          quantity: 'mass',
          values: each.map(({ reciprocatingKg }) => reciprocatingKg),
        },
        { name: 'Rotating', quantity: 'mass', values: each.map(({ rotatingKg }) => rotatingKg) },
        { name: 'Oil', quantity: 'mass', values: each.map(({ oilKg }) => oilKg) },
        { name: 'Bob-weight', quantity: 'mass', values: each.map((weight) => weight.kg) },
      ],
      units,
      `Balance factor ${percent} % of all the reciprocating mass on the pin, and all of the rotating mass and oil.`,
    ),
    pairTable(
      'Crank with bob-weights',
      left,
      units,
      grade ? 'Grade by ISO 21940-11.' : 'No crank mass: no grade.',
    ),
  ]
}

export function loadTables({ train, analysis, speed, units }: Printed): SheetTable[] {
  const { loads, mains, torque, gas, shaking } = analysis
  const rods = train.cylinders.filter(({ link }) => !link).sort((a, b) => byNumber(a.id, b.id))
  const pins = rods.map(({ id }) => loads[id].crankPinN!)
  const bearings = Object.entries(mains)
  const moment: Pair[] = [
    ['Turning moment, mean', torque.meanNm, 'torque'],
    ['Turning moment, most', torque.peakNm, 'torque'],
    ['Energy fluctuation', torque.energyFluctuationJ, 'energy'],
    ['Shaking force, most', peak(shaking.verticalN, shaking.horizontalN), 'force'],
    ['Shaking couple, most', peak(shaking.coupleVerticalNm, shaking.coupleHorizontalNm), 'torque'],
    [
      'Cylinder pressure, most',
      toSi(Math.max(...Object.values(gas).map(({ pressureBar }) => peak(pressureBar))), 'bar'),
      'pressure',
    ],
    [
      'Side thrust, most',
      Math.max(...Object.values(loads).map(({ sideThrustN }) => peak(sideThrustN))),
      'force',
    ],
  ]
  return [
    pairTable(`Moments and peaks ${atSpeed(speed)}`, moment, units),
    ...figureTables(
      'Rod on its crank pin',
      { name: 'Cylinder', values: rods.map(({ id }) => id) },
      [
        { name: 'Peak', quantity: 'force', values: pins.map((pin) => peak(pin.vertical, pin.horizontal)) },
        { name: 'Mean', quantity: 'force', values: pins.map((pin) => mean(pin.vertical, pin.horizontal)) },
      ],
      units,
    ),
    ...(bearings.length === 0
      ? []
      : figureTables(
          'Main bearings',
          { name: 'Main', values: bearings.map(([id]) => id) },
          [
            { name: 'Peak', quantity: 'force', values: bearings.map(([, { peakN }]) => peakN) },
            { name: 'Mean', quantity: 'force', values: bearings.map(([, { meanN }]) => meanN) },
          ],
          units,
          'Shared by the lever rule, as if the crank were hinged at every main.',
        )),
  ]
}
