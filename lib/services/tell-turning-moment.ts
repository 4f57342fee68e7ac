import type { BodyOf } from '@/lib/contracts/operation'
import type { TurningMomentAnswer, turningMoment as contract } from '@/lib/contracts/turning-moment'
import { byId } from '@/lib/mechanics/analysis/recorder'
import { flywheelInertia, speedFluctuation } from '@/lib/mechanics/loads/flywheel'
import { rodCouples } from '@/lib/mechanics/loads/rod-couples'
import { orderStar, torqueOrders } from '@/lib/mechanics/loads/torque-orders'
import { bankCylinders, momentFigures, torqueSignal } from '@/lib/mechanics/loads/turning-moment'
import { fromSi } from '@/lib/units/units'
import { loadsOf } from './loads-of'

const degrees = (angle: number) => fromSi(angle, '°')

/** Torque of a train by cylinder, bank and engine with what follows from it, for anybody who asks. */
export function tellTurningMoment(asked: BodyOf<typeof contract>): TurningMomentAnswer {
  const { parts, speed, shown, angleDeg, cautions } = loadsOf(
    asked,
    ({ cylinders, banks }) => 3 * (cylinders.length + banks.length + 1),
  )
  const { train, plan } = parts
  const moment = (cylinders?: number[]) => {
    const signal = (part: 'gas' | 'inertia' | 'total') => torqueSignal(parts, part, speed, cylinders)
    const total = signal('total')
    const { mean, most, least, energy } = momentFigures(total, train.cycle)
    return {
      gasNm: shown(signal('gas')),
      inertiaNm: shown(signal('inertia')),
      totalNm: shown(total),
      meanNm: mean,
      mostNm: most.value,
      mostAtDeg: degrees(most.angle),
      leastNm: least.value,
      leastAtDeg: degrees(least.angle),
      energyFluctuationJ: energy,
    }
  }
  const engine = moment()
  const energy = engine.energyFluctuationJ
  const inertia = train.inertia.flywheel + train.inertia.freeEnd
  const wanted = asked.speedFluctuation
  const [gas, still, total] = (['gas', 'inertia', 'total'] as const).map((part) =>
    torqueOrders(torqueSignal(parts, part, speed), train.cycle),
  )
  const wave = ({ amplitude, phase }: (typeof gas)[number]) => ({
    amplitudeNm: amplitude,
    phaseDeg: degrees(phase),
  })
  return {
    angleDeg,
    cylinders: byId(train.cylinders, (_, index) => moment([index])),
    banks: byId(train.banks, (_, index) => moment(bankCylinders(parts, index))),
    engine,
    powerKW: (engine.meanNm * speed) / 1000,
    flywheel: {
      inertiaKgM2: inertia > 0 ? inertia : null,
      speedFluctuation: inertia > 0 ? speedFluctuation(energy, inertia, speed) : null,
      wanted:
        wanted === undefined
          ? null
          : { speedFluctuation: wanted, inertiaKgM2: flywheelInertia(energy, wanted, speed) },
    },
    orders: gas.map((one, k) => {
      const { vectors, sum, major } = orderStar(plan.fires, one.order)
      return {
        order: one.order,
        gas: wave(one),
        inertia: wave(still[k]),
        total: wave(total[k]),
        star: {
          anglesDeg: byId(train.cylinders, (_, i) => degrees(Math.atan2(vectors[i].im, vectors[i].re))),
          sum: Math.hypot(sum.re, sum.im),
          sumAngleDeg: degrees(Math.atan2(sum.im, sum.re)),
          major,
        },
      }
    }),
    rodCouples: Object.fromEntries(
      rodCouples(parts, speed).map(({ cylinder, inertia: own, twoMass, error, peak, peakAngle }) => [
        train.cylinders[cylinder].id,
        {
          inertiaKgMm2: fromSi(own, 'kg mm²'),
          twoMassKgMm2: fromSi(twoMass, 'kg mm²'),
          errorKgMm2: fromSi(error, 'kg mm²'),
          peakNm: peak,
          peakAtDeg: degrees(peakAngle),
        },
      ]),
    ),
    cautions,
  }
}
