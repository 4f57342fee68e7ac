import type {
  balanceOrders as contract,
  designBalanceShafts as shaftsContract,
} from '@/lib/contracts/balance'
import type { AnswerOf, BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { DEGREES, KG_MM, MM } from '@/lib/mechanics/analysis/recorder'
import { layoutOrders } from '@/lib/mechanics/balance/layout-orders'
import { designShafts } from '@/lib/mechanics/balance/shaft-design'
import { textbookOrders } from '@/lib/mechanics/balance/textbook-orders'
import { bare, exactOrders, type OrderTurning, type Turning } from '@/lib/mechanics/balance/turning'
import { balanceVerdict } from '@/lib/mechanics/balance/verdict'
import { toSi } from '@/lib/units/units'
import { arrivingTrain } from './arriving-train'

const turningAnswer = ({ forward, backward, major, minor, tilt }: Turning, factor: number) => ({
  forward: forward.size * factor,
  forwardAngleDeg: forward.angle * DEGREES,
  backward: backward.size * factor,
  backwardAngleDeg: backward.angle * DEGREES,
  major: major * factor,
  minor: minor * factor,
  tiltDeg: tilt * DEGREES,
})

const orderAnswer =
  (factor: number) =>
  ({ order, force, couple }: OrderTurning) => ({
    order,
    force: turningAnswer(force, factor),
    couple: turningAnswer(couple, factor),
  })

/** Orders of force and couple by the sense in which they turn, at a speed and in the units of balancing tables. */
export function balanceOrders(body: BodyOf<typeof contract>): AnswerOf<typeof contract> {
  const { train } = arrivingTrain(body.train)
  const square = toSi(body.speedRpm, 'rpm') ** 2
  const [exact, without] = [exactOrders(train), exactOrders(bare(train))]
  const layout = layoutOrders(train)
  return {
    exact: exact.map(orderAnswer(square)),
    textbook: textbookOrders(train).map(orderAnswer(square)),
    bare: without.map(orderAnswer(square)),
    layout: {
      forceN: layout.scale.force * square,
      ratio: layout.scale.ratio,
      spacingMm: layout.scale.spacing === null ? null : layout.scale.spacing * MM,
      alike: layout.scale.alike,
      exact: layout.exact.map(orderAnswer(1)),
      textbook: layout.textbook.map(orderAnswer(1)),
    },
    verdict: balanceVerdict(train, without, exact).map((part) => ({
      ...part,
      bare: part.bare * square,
      left: part.left * square,
    })),
  }
}

/** Balance shafts for a chosen remainder, with what it is before and after. */
export function designBalanceShafts(body: BodyOf<typeof shaftsContract>): AnswerOf<typeof shaftsContract> {
  const { train } = arrivingTrain(body.train)
  const square = toSi(body.speedRpm, 'rpm') ** 2
  const cylinders = train.cylinders.map(({ axial }) => axial)
  const [first, last] = [Math.min(...cylinders), Math.max(...cylinders)]
  const outer = body.remove === 'force' || first === last ? [(first + last) / 2] : [first, last]
  const places = body.placesMm?.map((place) => place / MM) ?? outer
  if (body.remove !== 'force' && new Set(places).size < 2)
    throw refused([
      {
        path: 'placesMm',
        code: 'one-place',
        message: 'A couple needs weights at two places along the crank.',
        fix: 'Give two places, such as the ends of the block.',
      },
    ])
  const shafts = designShafts(train, {
    order: body.order,
    remove: body.remove,
    places,
    horizontal: body.horizontalMm / MM,
    vertical: body.verticalMm / MM,
  })
  const state = (shaftsThere: typeof shafts) => {
    const found = exactOrders({ ...train, balanceShafts: shaftsThere }).find(
      ({ order }) => order === body.order,
    )!
    return { force: turningAnswer(found.force, square), couple: turningAnswer(found.couple, square) }
  }
  return {
    balanceShafts: shafts.map((shaft) => ({
      id: shaft.id,
      speedRatio: shaft.speedRatio,
      angleDeg: shaft.angle * DEGREES,
      unbalanceKgMm: shaft.unbalance * KG_MM,
      axialMm: shaft.axial * MM,
      horizontalMm: shaft.horizontal * MM,
      verticalMm: shaft.vertical * MM,
    })),
    before: state(train.balanceShafts),
    after: state([...train.balanceShafts, ...shafts]),
  }
}
