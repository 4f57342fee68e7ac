import { bobWeights } from '@/lib/mechanics/balance'
import { firingAngles } from '@/lib/mechanics/firing'
import { leastCounterweights } from '@/lib/mechanics/layouts/counterweights'
import type { Layout } from '@/lib/mechanics/layouts/layout'
import { wrap } from '@/lib/numerics/wrap'
import { fromSi, toSi } from '@/lib/units/units'
import { crankTrainSchema, shapeSchema, type CrankTrain } from '@/scene/model/crank-train'
import { cylinderValues } from '@/scene/model/cylinder-values'
import { toTrain } from '@/scene/model/to-train'
import { setOut } from './set-out'
import { throwPitch } from './structure'

/** What of a found layout makes the crank train; the rest is worked out anew. */
export type LayoutPlan = Pick<Layout, 'bankAngle' | 'split' | 'throwAngles' | 'order' | 'intervals'>

/** Angles of a grid are whole or simple fractions of a degree: rounding away what radians added. */
const degrees = (angle: number) => Number(fromSi(angle, '°').toFixed(6))
/** A counterweight lighter than this share of the heaviest is none. */
const NO_WEIGHT = 1e-6
/** An offset moves dead centres a little from where the layout has them; further off is another turn, rad. */
const SAME_INTERVAL = toSi(10, '°')

/**
 * A found layout as a whole crank train with the sizes, masses, speeds and gas of `base`, and the least counterweights that
 * balance it with its bob-weights.
 */
export function layoutDocument(layout: LayoutPlan, base: CrankTrain): CrankTrain {
  const { bankAngle, split, throwAngles, order } = layout
  const like = cylinderValues(base, base.cylinders.find(({ link }) => !link) ?? base.cylinders[0])
  const paired = bankAngle !== null && order.length === 2 * throwAngles.length
  const half = bankAngle === null ? 0 : degrees(bankAngle / 2)
  const cycle =
    layout.intervals.reduce((sum, interval) => sum + interval, 0) > 3 * Math.PI ? 'four-stroke' : 'two-stroke'
  const sameSpacing =
    base.banks.length > 1 === paired && base.cylinders.length === base.throws.length * (paired ? 2 : 1)
  const laid = setOut({
    title: titleOf(layout, cycle),
    cycle,
    bankAngles: bankAngle === null ? [0] : [-half, half],
    throwAngles: throwAngles.map(degrees),
    arrangement: paired || bankAngle === null ? 'every-bank' : 'banks-in-turn',
    boreMm: like.boreMm,
    strokeMm: like.strokeMm,
    pitchMm: sameSpacing ? throwPitch(base) : undefined,
    splitDeg: degrees(split),
  })
  const pinsPerThrow = laid.throws.length / throwAngles.length
  const rodsOnPin = laid.cylinders.length / laid.throws.length
  const unbalanceOfRod = base.throws.reduce((sum, pin) => sum + pin.unbalanceKgMm, 0) / base.cylinders.length
  const { boreMm, strokeMm, rodLengthMm, offsetMm, compressionRatio, ...values } = like
  const { pistonKg, pistonPinKg, ringsKg, locksKg, rod, bigEndBearingKg, oilAllowanceKg } = values
  const document = crankTrainSchema.parse({
    ...laid,
    rotation: base.rotation,
    operating: base.operating ?? laid.operating,
    cylinderDefaults: { boreMm, strokeMm, rodLengthMm, offsetMm, compressionRatio },
    masses: { pistonKg, pistonPinKg, ringsKg, locksKg, rod, bigEndBearingKg, oilAllowanceKg },
    balanceFactor: base.balanceFactor,
    throws: laid.throws.map((pin) => ({ ...pin, unbalanceKgMm: unbalanceOfRod * rodsOnPin })),
    firingOrder: order.map((cylinder) => laid.cylinders[cylinder].id),
    gas: base.cycle === cycle ? base.gas : laid.gas,
    crankcasePressureBar: base.crankcasePressureBar,
    inertia: base.inertia,
    shape: shapeOf(base, sameSpacing && pinsPerThrow === 1),
  })
  return withTurns(withCounterweights(document, throwAngles.length), layout)
}

/** Two webs a throw, where the usual proportions put them. */
function withCounterweights(document: CrankTrain, throws: number): CrankTrain {
  const bare = toTrain({ ...document, counterweights: [] })
  const weights = bobWeights(bare)
  const pins = bare.throws.map(({ angle, axial, radius, unbalance }, index) => {
    const moment = (weights[index].mass - weights[index].oil) * radius + unbalance
    return { place: axial, moment: { re: moment * Math.cos(angle), im: moment * Math.sin(angle) } }
  })
  const places = document.counterweights.map(({ axialMm }) => toSi(axialMm, 'mm'))
  if (places.length !== 2 * throws) throw new Error('A set-out crank has two webs a throw.')
  const needed = leastCounterweights(pins, places)
  const sizes = needed.map(({ re, im }) => Math.hypot(re, im))
  const heaviest = Math.max(...sizes)
  const whole = Math.max(...pins.map(({ moment }) => Math.hypot(moment.re, moment.im)))
  return {
    ...document,
    counterweights: document.counterweights.flatMap((weight, i) =>
      sizes[i] <= NO_WEIGHT * Math.max(heaviest, whole)
        ? []
        : [
            {
              ...weight,
              angleDeg: wrap(fromSi(Math.atan2(needed[i].im, needed[i].re), '°'), 360),
              massKg: sizes[i] / toSi(weight.radiusMm, 'mm'),
            },
          ],
    ),
  }
}

/** States each cylinder's firing angle where the order alone would be read as other intervals. */
function withTurns(document: CrankTrain, { order, intervals }: LayoutPlan): CrankTrain {
  const train = toTrain(document)
  const angles = firingAngles(train)
  const wanted: number[] = []
  order.reduce((at, cylinder, place) => {
    wanted[cylinder] = at
    return at + intervals[place]
  }, 0)
  const cycle = train.cycle
  const off = (cylinder: number) =>
    wrap(angles[cylinder] - angles[order[0]] - wanted[cylinder] + SAME_INTERVAL, cycle) > 2 * SAME_INTERVAL
  if (!order.some(off)) return document
  const start = angles[order[0]]
  return {
    ...document,
    cylinders: document.cylinders.map((entry, cylinder) => {
      // the exact top dead centre that is nearest: an offset moves it a little
      const meant = start + wanted[cylinder]
      const turn = Math.round((meant - angles[cylinder]) / (2 * Math.PI))
      const fires = wrap(angles[cylinder] + turn * 2 * Math.PI, cycle)
      return { ...entry, firesAtDeg: Number(fromSi(fires, '°').toFixed(6)) }
    }),
  }
}

const acrossCrank = shapeSchema.pick({
  pinDiaMm: true,
  mainDiaMm: true,
  webWidthMm: true,
  counterweightRadiusMm: true,
  compressionHeightMm: true,
  skirtBelowPinMm: true,
  builtUp: true,
})

/** Lengths along the crank go with the spacing of the throws; without it the pictures use usual proportions. */
function shapeOf({ shape }: CrankTrain, sameSpacing: boolean): CrankTrain['shape'] {
  if (!shape || sameSpacing) return shape
  return acrossCrank.parse(shape)
}

function titleOf({ bankAngle, split, throwAngles, order }: LayoutPlan, cycle: CrankTrain['cycle']): string {
  const form =
    bankAngle === null
      ? `${order.length} in line`
      : degrees(bankAngle) === 180
        ? `flat ${order.length}`
        : `${degrees(bankAngle)}° V${order.length}`
  const pins = throwAngles.map((angle) => Number(degrees(angle).toFixed(1))).join('/')
  const apart = split === 0 ? '' : `, pins split ${Math.abs(degrees(split))}°`
  return `${cycle === 'two-stroke' ? 'Two-stroke ' : ''}${form}, ${pins}${apart}`
}
