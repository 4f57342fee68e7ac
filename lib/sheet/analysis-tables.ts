import type { Analysis } from '@/lib/mechanics/analysis'
import { fileUnit } from '@/lib/units/file-unit'
import type { UnitName } from '@/lib/units/units'
import type { Cell, Column, Table } from '@/lib/tables/table'

const column = (name: string, unit: UnitName = ''): Column => ({ name, unit, si: fileUnit(unit) })

type Signal = readonly number[]

/** Signals side by side along the crank angle. */
function along(title: string, angleDeg: Signal, signals: [string, UnitName, Signal][]): Table {
  return {
    title,
    columns: [column('Crank angle', '°'), ...signals.map(([name, unit]) => column(name, unit))],
    rows: angleDeg.map((angle, i) => [angle, ...signals.map(([, , values]) => values[i])]),
  }
}

const listed = (title: string, columns: Column[], rows: Cell[][]): Table => ({ title, columns, rows })

/** Every figure of an analysis as tables, so that each can be taken away as a file. */
export function analysisTables(analysis: Required<Analysis>): Table[] {
  const { angleDeg, kinematics, gas, loads, mains, torque, shaking } = analysis
  return [
    summaryTable(analysis),
    firingTable(analysis),
    intervalTable(analysis),
    orderTable(analysis),
    ...balanceTables(analysis),
    along('Turning moment', angleDeg, [
      ['Gas', 'N m', torque.gasNm],
      ['Inertia', 'N m', torque.inertiaNm],
      ['Total', 'N m', torque.totalNm],
    ]),
    along('Shaking force and couple', angleDeg, [
      ['Force vertical', 'N', shaking.verticalN],
      ['Force horizontal', 'N', shaking.horizontalN],
      ['Couple vertical', 'N m', shaking.coupleVerticalNm],
      ['Couple horizontal', 'N m', shaking.coupleHorizontalNm],
    ]),
    ...Object.entries(mains).map(([id, main]) =>
      along(`Load on main ${id}`, angleDeg, [
        ['Vertical', 'N', main.vertical],
        ['Horizontal', 'N', main.horizontal],
      ]),
    ),
    ...Object.entries(kinematics).map(([id, motion]) =>
      along(`Motion of piston ${id}`, angleDeg, [
        ['Pin height', 'mm', motion.pinHeightMm],
        ['Travel from top dead centre', 'mm', motion.travelMm],
        ['Velocity', 'm/s', motion.velocityMS],
        ['Acceleration', 'm/s²', motion.accelerationMS2],
        ['Rod angle', '°', motion.rodAngleDeg],
      ]),
    ),
    ...Object.entries(loads).map(([id, load]) =>
      along(`Pressure and loads of cylinder ${id}`, angleDeg, [
        ['Pressure', 'bar', gas[id].pressureBar],
        ['Gas force', 'N', load.gasForceN],
        ['Piston pin along the cylinder', 'N', load.pistonPinN.u],
        ['Piston pin across', 'N', load.pistonPinN.v],
        ['Side thrust', 'N', load.sideThrustN],
        ...pinSignals(load),
      ]),
    ),
  ]
}

function pinSignals({
  crankPinN,
  knuckleN,
}: Required<Analysis>['loads'][string]): [string, UnitName, Signal][] {
  return [
    ...(crankPinN
      ? ([
          ['Crank pin radial', 'N', crankPinN.radial],
          ['Crank pin tangential', 'N', crankPinN.tangential],
          ['Crank pin vertical', 'N', crankPinN.vertical],
          ['Crank pin horizontal', 'N', crankPinN.horizontal],
        ] satisfies [string, UnitName, Signal][])
      : []),
    ...(knuckleN
      ? ([
          ['Knuckle pin vertical', 'N', knuckleN.vertical],
          ['Knuckle pin horizontal', 'N', knuckleN.horizontal],
        ] satisfies [string, UnitName, Signal][])
      : []),
  ]
}

/** One figure a row: each has a unit of its own, so the unit is a column. */
function summaryTable({ train, torque, mains }: Required<Analysis>): Table {
  const rows: Cell[][] = [
    ['Cylinders', train.cylinderCount, ''],
    ['Swept volume', train.displacementCc, 'cm³'],
    ['Mean piston speed', train.meanPistonSpeedMS, 'm/s'],
    ['Turning moment, mean', torque.meanNm, 'N m'],
    ['Turning moment, most', torque.peakNm, 'N m'],
    ['Energy fluctuation', torque.energyFluctuationJ, 'J'],
    ...Object.entries(mains).flatMap(([id, { peakN, meanN }]): Cell[][] => [
      [`Main ${id}, most`, peakN, 'N'],
      [`Main ${id}, mean`, meanN, 'N'],
    ]),
  ]
  return listed('Main figures', [column('Figure'), column('Value'), column('Unit')], rows)
}

const firingTable = ({ firing }: Required<Analysis>): Table =>
  listed(
    'Firing',
    [column('Cylinder'), column('Fires at', '°'), column('Then to the next', '°')],
    firing.events.map(({ cylinder, angleDeg }, i) => [cylinder, angleDeg, firing.intervalsDeg[i]]),
  )

function intervalTable({ firing }: Required<Analysis>): Table {
  const rows = (kind: string, groups: Required<Analysis>['firing']['banks']): Cell[][] =>
    Object.entries(groups).flatMap(([id, { intervalsDeg }]) =>
      intervalsDeg.map((interval, i): Cell[] => [`${kind} ${id}`, i + 1, interval]),
    )
  return listed(
    'Intervals by bank and collector',
    [column('Of'), column('Number'), column('Interval', '°')],
    [...rows('Bank', firing.banks), ...rows('Collector', firing.collectors)],
  )
}

const orderTable = ({ orders }: Required<Analysis>): Table =>
  listed(
    'Orders',
    [
      column('Order'),
      column('Vertical', 'N'),
      column('Vertical phase', '°'),
      column('Horizontal', 'N'),
      column('Horizontal phase', '°'),
      column('Forward', 'N'),
      column('Backward', 'N'),
      column('Couple vertical', 'N m'),
      column('Couple vertical phase', '°'),
      column('Couple horizontal', 'N m'),
      column('Couple horizontal phase', '°'),
      column('Couple forward', 'N m'),
      column('Couple backward', 'N m'),
      column('Turning moment', 'N m'),
    ],
    orders.map((each) => [
      each.order,
      each.vertical.amplitudeN,
      each.vertical.phaseDeg,
      each.horizontal.amplitudeN,
      each.horizontal.phaseDeg,
      each.forwardN,
      each.backwardN,
      each.coupleVertical.amplitudeNm,
      each.coupleVertical.phaseDeg,
      each.coupleHorizontal.amplitudeNm,
      each.coupleHorizontal.phaseDeg,
      each.forwardNm,
      each.backwardNm,
      each.torqueNm,
    ]),
  )

function balanceTables({ balance }: Required<Analysis>): Table[] {
  const { residual, grade } = balance
  return [
    listed(
      'Masses of the cylinders',
      [column('Cylinder'), column('Reciprocating', 'kg'), column('Rotating', 'kg')],
      Object.entries(balance.cylinders).map(([id, each]) => [id, each.reciprocatingKg, each.rotatingKg]),
    ),
    listed(
      'Bob-weights',
      [
        column('Throw'),
        column('Bob-weight', 'kg'),
        column('Reciprocating', 'kg'),
        column('Rotating', 'kg'),
        column('Oil', 'kg'),
      ],
      Object.entries(balance.bobWeights).map(([id, each]) => [
        id,
        each.kg,
        each.reciprocatingKg,
        each.rotatingKg,
        each.oilKg,
      ]),
    ),
    listed(
      'Residual unbalance',
      [
        column('Static', 'kg mm'),
        column('Static angle', '°'),
        column('Couple', 'kg mm²'),
        column('Couple angle', '°'),
        column('Permissible', 'kg mm'),
      ],
      [
        [
          residual.staticKgMm,
          residual.staticAngleDeg,
          residual.coupleKgMm2,
          residual.coupleAngleDeg,
          grade?.permissibleKgMm ?? null,
        ],
      ],
    ),
  ]
}
