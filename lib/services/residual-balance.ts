import type { residualBalance as contract } from '@/lib/contracts/balance'
import type { AnswerOf, BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { residualAnswer } from '@/lib/mechanics/analysis/balance'
import { DEGREES, KG_MM, MM } from '@/lib/mechanics/analysis/recorder'
import { permissibleUnbalance, residualUnbalance } from '@/lib/mechanics/balance'
import { massEffect } from '@/lib/mechanics/balance/mass-change'
import { phasor } from '@/lib/mechanics/balance/phasor'
import { bearingPlanes, residualInPlanes, toleranceShares } from '@/lib/mechanics/balance/two-planes'
import type { Train } from '@/lib/mechanics/train'
import { fromSi, toSi } from '@/lib/units/units'
import { arrivingTrain } from './arriving-train'

type Body = BodyOf<typeof contract>
type Residual = ReturnType<typeof residualUnbalance>

/** The residual unbalance as a balancing machine shows it, and what a change of a part's mass makes of it. */
export function residualBalance(body: Body): AnswerOf<typeof contract> {
  const { train } = arrivingTrain(body.train)
  const planes = body.planesMm ? body.planesMm.map((place) => place / MM) : bearingPlanes(train)
  if (!planes)
    throw refused([
      {
        path: 'planesMm',
        code: 'no-planes',
        message: 'With one throw and fewer than two mains there are no two planes to show the residual in.',
        fix: 'Give two places along the crank, or the mains.',
      },
    ])
  const [a, b] = planes
  const speed = body.speedRpm === undefined ? train.operating.max : toSi(body.speedRpm, 'rpm')
  const permissible =
    train.crankMass === undefined || speed === undefined
      ? null
      : permissibleUnbalance(train.crankMass, body.gradeMmS / 1000, speed)
  const centre = body.centreMm === undefined ? (a + b) / 2 : body.centreMm / MM
  const shares = toleranceShares(a, b, centre)
  const inPlanes = (residual: Residual) => {
    const found = residualInPlanes(residual, a - train.referenceAxial, b - train.referenceAxial)
    const [first, second] = [a, b].map((axial, i) => {
      const { size, angle } = phasor(found[i])
      const allowed = permissible === null ? null : permissible * shares[i]
      return {
        axialMm: axial * MM,
        unbalanceKgMm: size * KG_MM,
        angleDeg: angle * DEGREES,
        permissibleKgMm: allowed === null ? null : allowed * KG_MM,
        within: allowed === null ? null : size <= allowed,
      }
    })
    return [first, second] as [typeof first, typeof second]
  }
  const residual = residualUnbalance(train)
  return {
    residual: residualAnswer(residual),
    grade:
      permissible === null || speed === undefined
        ? null
        : { gradeMmS: body.gradeMmS, speedRpm: fromSi(speed, 'rpm'), permissibleKgMm: permissible * KG_MM },
    planes: inPlanes(residual),
    changed: body.change ? changed(train, body.change, speed, inPlanes) : null,
  }
}

function changed<P>(
  train: Train,
  { cylinders, moves, massKg }: NonNullable<Body['change']>,
  speed: number | undefined,
  inPlanes: (residual: Residual) => P,
) {
  const indices = cylinders?.map((id, place) => {
    const index = train.cylinders.findIndex((cylinder) => cylinder.id === id)
    if (index >= 0) return index
    throw refused([
      {
        path: `change.cylinders.${place}`,
        code: 'unknown-cylinder',
        message: `There is no cylinder “${id}”.`,
        fix: `Name one of ${train.cylinders.map((cylinder) => cylinder.id).join(', ')}.`,
      },
    ])
  })
  const effect = effectOf(train, indices ?? train.cylinders.map((_, index) => index), moves, massKg)
  const atSpeed = (value: number) => (speed === undefined ? null : value * speed ** 2)
  return {
    residual: residualAnswer(effect.after),
    planes: inPlanes(effect.after),
    change: residualAnswer(effect.change),
    forceN: atSpeed(effect.change.static.size),
    coupleNm: atSpeed(effect.change.couple.size),
    alongBoreN: atSpeed(effect.alongBore),
  }
}

function effectOf(train: Train, cylinders: number[], moves: 'reciprocating' | 'rotating', mass: number) {
  try {
    return massEffect(train, { cylinders, moves, mass })
  } catch (error) {
    if (!(error instanceof RangeError)) throw error
    throw refused([
      {
        path: 'change.massKg',
        code: 'too-light',
        message: error.message,
        fix: 'Take off less than the part weighs.',
      },
    ])
  }
}
