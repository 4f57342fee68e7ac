import { type Analysis } from '@/lib/mechanics/analysis'
import { permissibleUnbalance, residualUnbalance } from '@/lib/mechanics/balance'
import { webLoad } from '@/lib/mechanics/balance/half-disc'
import { turningOrders } from '@/lib/mechanics/balance/turning'
import { residualInPlanes, toleranceShares } from '@/lib/mechanics/balance/two-planes'
import { clearanceModel, leastGap } from '@/lib/mechanics/clearance/clearances'
import type { Pair } from '@/lib/mechanics/clearance/pairs'
import { type FigureId } from '@/lib/mechanics/explain/explain'
import type { Asked } from '@/lib/mechanics/explain/engine'
import { rankOrder } from '@/lib/mechanics/firing-ranking'
import { indicated } from '@/lib/mechanics/indicated'
import {
  bearings,
  bearingSignal,
  projectedArea,
  turnedSignal,
  type Bearing,
} from '@/lib/mechanics/loads/bearings'
import { cycleParts, type CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { loadFigures } from '@/lib/mechanics/loads/load-figures'
import { signalAt } from '@/lib/mechanics/loads/part-signals'
import { orderStar, torqueOrders } from '@/lib/mechanics/loads/torque-orders'
import { leastLoadedSector, surfaceLoad } from '@/lib/mechanics/loads/surface-load'
import { buildPlan } from '@/lib/mechanics/plan'
import type { Train } from '@/lib/mechanics/train'

export const AT = 372
export const speed = (4321 * 2 * Math.PI) / 60
export interface Row {
  figure: FigureId
  asked?: Partial<Asked>
  /** Only where the train has it. */
  where?(train: Train): boolean
  /** In the unit of the explanation. */
  shown(analysis: Required<Analysis>, cylinder: string, train: Train): number
}

/** The figure of the analysis that each explanation has to meet. */
export const rows: Row[] = [
  { figure: 'displacement', shown: ({ train }) => train.displacementCc },
  { figure: 'mean-piston-speed', shown: ({ train }) => train.meanPistonSpeedMS },
  { figure: 'pin-height', shown: (all, id) => at(all, all.kinematics[id].pinHeightMm) },
  { figure: 'piston-travel', shown: (all, id) => at(all, all.kinematics[id].travelMm) },
  { figure: 'piston-velocity', shown: (all, id) => at(all, all.kinematics[id].velocityMS) },
  { figure: 'piston-acceleration', shown: (all, id) => at(all, all.kinematics[id].accelerationMS2) },
  { figure: 'rod-angle', shown: (all, id) => at(all, all.kinematics[id].rodAngleDeg) },
  { figure: 'true-stroke', shown: (all, id) => all.kinematics[id].strokeMm },
  { figure: 'top-dead-centre', shown: (all, id) => all.kinematics[id].tdcDeg },
  { figure: 'bottom-dead-centre', shown: (all, id) => all.kinematics[id].bdcDeg },
  { figure: 'gas-force', shown: (all, id) => at(all, all.loads[id].gasForceN) },
  { figure: 'side-thrust', shown: (all, id) => at(all, all.loads[id].sideThrustN) },
  {
    figure: 'rod-load',
    shown: (all, id) => {
      const on = all.loads[id].crankPinN ?? all.loads[id].knuckleN!
      return Math.hypot(at(all, on.vertical), at(all, on.horizontal))
    },
  },
  {
    figure: 'shaking-force',
    shown: (all) => Math.hypot(at(all, all.shaking.verticalN), at(all, all.shaking.horizontalN)),
  },
  {
    figure: 'shaking-couple',
    shown: (all) =>
      Math.hypot(at(all, all.shaking.coupleVerticalNm), at(all, all.shaking.coupleHorizontalNm)),
  },
  ...[1, 2, 4].flatMap((order): Row[] => [
    { figure: 'order-forward', asked: { order }, shown: (all) => orderOf(all, order).forwardN },
    { figure: 'order-backward', asked: { order }, shown: (all) => orderOf(all, order).backwardN },
    { figure: 'order-couple-forward', asked: { order }, shown: (all) => orderOf(all, order).forwardNm },
    { figure: 'order-couple-backward', asked: { order }, shown: (all) => orderOf(all, order).backwardNm },
  ]),
  { figure: 'torque', shown: (all) => at(all, all.torque.totalNm) },
  { figure: 'torque-mean', shown: (all) => all.torque.meanNm },
  { figure: 'torque-peak', shown: (all) => all.torque.peakNm },
  { figure: 'energy-fluctuation', shown: (all) => all.torque.energyFluctuationJ },
  { figure: 'main-peak', shown: ({ mains }) => Math.max(...Object.values(mains).map(({ peakN }) => peakN)) },
  { figure: 'main-mean', asked: { main: 'M1' }, shown: ({ mains }) => mains.M1.meanN },
  {
    figure: 'firing-evenness',
    shown: ({ firing }) => Math.max(...firing.intervalsDeg) - Math.min(...firing.intervalsDeg),
  },
  {
    figure: 'firing-interval',
    shown: ({ firing }, id) =>
      firing.intervalsDeg[firing.events.findIndex(({ cylinder }) => cylinder === id)],
  },
  { figure: 'reciprocating-mass', shown: ({ balance }, id) => balance.cylinders[id].reciprocatingKg },
  { figure: 'rotating-mass', shown: ({ balance }, id) => balance.cylinders[id].rotatingKg },
  { figure: 'residual-static', shown: ({ balance }) => balance.residual.staticKgMm * 1000 },
  { figure: 'residual-couple', shown: ({ balance }) => balance.residual.coupleKgMm2 * 1000 },
  { figure: 'permissible-residual', shown: ({ balance }) => balance.grade!.permissibleKgMm * 1000 },
  ...(['near', 'far'] as const).flatMap((side, i): Row[] => {
    const asked = { planeMm: [-40, 260][i], otherPlaneMm: [260, -40][i] }
    const places = [-0.04, 0.26] as const
    return [
      {
        figure: 'plane-residual',
        asked,
        shown: (_all, _id, train) => {
          const [a, b] = places.map((place) => place - train.referenceAxial)
          const shown = residualInPlanes(residualUnbalance(train), a, b)[i]
          return Math.hypot(shown.re, shown.im) * 1e6
        },
      },
      {
        figure: 'plane-permissible',
        asked,
        shown: (_all, _id, train) =>
          permissibleUnbalance(train.crankMass!, 0.016, train.operating.max!)! *
          toleranceShares(...places, 0.11)[side === 'near' ? 0 : 1] *
          1e6,
      },
    ]
  }),
  {
    figure: 'counterweight-share',
    where: hasWeights,
    shown: (_all, _id, train) => {
      const { moment, capacity } = webLoad(train.counterweights[0], web, { density: 18_000 })
      return (100 * moment) / capacity
    },
  },
  ...(['slug-volume', 'slug-mass', 'slug-diameter'] as const).map((figure): Row => ({
    figure,
    asked: { slugDensity: 17_000 },
    where: hasWeights,
    shown: (_all, _id, train) => {
      const { slug } = webLoad(train.counterweights[0], web, { density: 17_000 })
      const { volume, mass, diameter } = slug ?? { volume: 0, mass: 0, diameter: 0 }
      return { 'slug-volume': volume * 1e6, 'slug-mass': mass * 1000, 'slug-diameter': diameter * 1000 }[
        figure
      ]
    },
  })),
  {
    figure: 'skirt-to-counterweight',
    where: hasWeights,
    shown: (_all, id, train) =>
      gapIn(train, { kind: 'skirt-counterweight', cylinder: place(train, id), counterweight: 0 }),
  },
  {
    figure: 'piston-to-deck',
    shown: (_all, id, train) => gapIn(train, { kind: 'piston-deck', cylinder: place(train, id) }),
  },
  {
    figure: 'bore-wall',
    asked: { cylinder: undefined },
    where: hasNeighbour,
    shown: (_all, _id, train) => gapIn(train, { kind: 'bore-wall', cylinder: 0, other: neighbour(train) }),
  },
  {
    figure: 'rod-pull',
    shown: (_all, id, train) =>
      signalAt(
        partsOf(train).gas.rodPull[place(train, id)],
        partsOf(train).inertia.rodPull[place(train, id)],
        'total',
        speed,
      )[AT % partsOf(train).angle.length],
  },
  ...[1, 2].flatMap((order): Row[] => {
    const turned = (all: Required<Analysis>) => turningOrders(all.orders).find((one) => one.order === order)!
    return [
      { figure: 'order-long-axis', asked: { order }, shown: (all) => turned(all).force.major },
      { figure: 'order-short-axis', asked: { order }, shown: (all) => turned(all).force.minor },
      { figure: 'order-couple-long-axis', asked: { order }, shown: (all) => turned(all).couple.major },
      { figure: 'order-couple-short-axis', asked: { order }, shown: (all) => turned(all).couple.minor },
    ]
  }),
  ...[1, 2].flatMap((order): Row[] => [
    {
      figure: 'torque-order',
      asked: { order },
      shown: ({ torque }, _id, train) =>
        torqueOrders(torque.totalNm, train.cycle).find((one) => one.order === order)!.amplitude,
    },
    {
      figure: 'order-vector-sum',
      asked: { order },
      shown: (_all, _id, train) => {
        const { sum } = orderStar(buildPlan(train, speed).fires, order)
        return Math.hypot(sum.re, sum.im)
      },
    },
  ]),
  { figure: 'mean-power', shown: (all) => (all.torque.meanNm * speed) / 1000 },
  { figure: 'imep', shown: (_all, id, train) => perSwept(train, id, 'netWork') },
  { figure: 'imep-gross', shown: (_all, id, train) => perSwept(train, id, 'grossWork') },
  {
    figure: 'imep-gross',
    asked: { cylinder: undefined },
    shown: (_all, _id, train) => indicated(buildPlan(train, speed)).grossPressure / 1e5,
  },
  {
    figure: 'indicated-power',
    asked: { cylinder: undefined },
    shown: (_all, _id, train) => indicated(buildPlan(train, speed)).power / 1000,
  },
  {
    figure: 'peak-pressure',
    shown: (_all, id, train) =>
      indicated(buildPlan(train, speed)).cylinders[place(train, id)].peakPressure / 1e5,
  },
  { figure: 'firing-rms', shown: (_all, _id, train) => (presentOrder(train).rms * 180) / Math.PI },
  {
    figure: 'collector-spread',
    shown: (_all, _id, train) => (presentOrder(train).collectorSpread * 180) / Math.PI,
  },
  { figure: 'same-bank', shown: (_all, _id, train) => presentOrder(train).sameBank },
  { figure: 'same-throw', shown: (_all, _id, train) => presentOrder(train).sameThrow },
  { figure: 'next-throw', shown: (_all, _id, train) => presentOrder(train).adjacentThrow },
  ...(['pin', 'rod', 'main'] as const).flatMap((kind): Row[] => {
    const asked =
      kind === 'pin' ? { throw: '1' } : kind === 'main' ? { main: 'M2' } : ({} satisfies Partial<Asked>)
    const where = (train: Train) =>
      kind === 'main'
        ? train.mains.some(({ id }) => id === 'M2')
        : kind === 'rod'
          ? train.cylinders.every(({ link }) => !link)
          : train.throws.some(({ id }) => id === '1')
    const of = (train: Train, id: string) => bearingIn(train, kind, { pin: '1', main: 'M2', rod: id }[kind])
    return [
      { figure: 'bearing-peak', asked, where, shown: (_all, id, train) => of(train, id).figures.peak },
      { figure: 'bearing-mean', asked, where, shown: (_all, id, train) => of(train, id).figures.mean },
      {
        figure: 'bearing-peak-on-area',
        asked,
        where,
        shown: (_all, id, train) => of(train, id).figures.specific! / 1e6,
      },
      {
        figure: 'bearing-mean-on-area',
        asked,
        where,
        shown: (_all, id, train) => of(train, id).figures.mean / of(train, id).area! / 1e6,
      },
      {
        figure: 'least-loaded-sector',
        asked,
        where,
        shown: (_all, id, train) => 100 * of(train, id).sector.share,
      },
    ]
  }),
]

/** Sizes in m, the same for every preset: the counterweights of some are beyond such a web, of some within. */
export const sizes = {
  pinDia: 0.05,
  pinLength: 0.04,
  mainDia: 0.06,
  mainLength: 0.03,
  webThickness: 0.02,
  counterweightRadius: 0.07,
  skirtBelowPin: 0.02,
  crownAbovePin: 0.03,
  deckHeight: 0.25,
}
const web = { radius: 0.07, thickness: 0.02, density: 7850 }

export function hasWeights({ counterweights }: Train) {
  return counterweights.length > 0
}
function neighbour({ cylinders }: Train) {
  return cylinders.findIndex(({ bank }, i) => i > 0 && bank === cylinders[0].bank)
}
export function hasNeighbour(train: Train) {
  return neighbour(train) > 0
}
const place = ({ cylinders }: Train, id: string) => cylinders.findIndex((one) => one.id === id)

const gapIn = (train: Train, pair: Pair) =>
  leastGap(
    clearanceModel(train, {
      pistons: train.cylinders.map(() => ({ crown: sizes.crownAbovePin, skirt: sizes.skirtBelowPin })),
      rods: [],
      boreBottoms: [],
      counterweights: train.counterweights.map(() => ({ from: 0, to: 1, radius: sizes.counterweightRadius })),
      webs: [],
      deck: sizes.deckHeight,
    }),
    pair,
  ).gap * 1000

const perSwept = (train: Train, id: string, work: 'netWork' | 'grossWork') => {
  const one = indicated(buildPlan(train, speed)).cylinders[place(train, id)]
  return one[work] / one.swept / 1e5
}

const presentOrder = (train: Train) =>
  rankOrder(
    train,
    train.firingOrder,
    train.cylinders.map(({ firesAt }) => firesAt),
  )

const known = new WeakMap<Train, CycleParts>()
function partsOf(train: Train): CycleParts {
  const parts = known.get(train) ?? cycleParts(train)
  known.set(train, parts)
  return parts
}

function bearingIn(train: Train, kind: Bearing['kind'], id: string) {
  const parts = partsOf(train)
  const bearing = bearings(parts).find((one) => one.kind === kind && one.id === id)!
  const area = projectedArea(parts, bearing, {
    pin: { diameter: sizes.pinDia, length: sizes.pinLength },
    main: { diameter: sizes.mainDia, length: sizes.mainLength },
  })
  const load = bearingSignal(parts, bearing, 'total', speed)
  const { radial, tangential } = turnedSignal(load, bearing.stand)
  return {
    area,
    figures: loadFigures(load, parts.angle, area),
    sector: leastLoadedSector(surfaceLoad(radial, tangential, bearing.pressed)),
  }
}

const at = ({ angleDeg }: Analysis, signal: number[]) => signal[angleDeg.indexOf(AT % angleDeg.length)]
const orderOf = ({ orders }: Required<Analysis>, order: number) => orders.find((one) => one.order === order)!
