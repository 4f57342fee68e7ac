import type { BearingLoadsAnswer, bearingLoads as contract } from '@/lib/contracts/bearing-loads'
import type { BodyOf } from '@/lib/contracts/operation'
import { bearings, bearingSignal, projectedArea, turnedSignal } from '@/lib/mechanics/loads/bearings'
import { loadFigures } from '@/lib/mechanics/loads/load-figures'
import type { LoadPart } from '@/lib/mechanics/loads/part-signals'
import { leastLoadedSector, surfaceLoad, type Sector } from '@/lib/mechanics/loads/surface-load'
import { fromSi } from '@/lib/units/units'
import { bearingSizes } from '@/scene/model/bearing-sizes'
import { loadsOf } from './loads-of'

/** Polar loads of every bearing of a train, for anybody who asks. */
export function listBearingLoads(asked: BodyOf<typeof contract>): BearingLoadsAnswer {
  const include = new Set(asked.include)
  const { document, parts, speed, shown, angleDeg, cautions } = loadsOf(
    asked,
    ({ throws, cylinders, mains }) => 4 * include.size * (throws.length + cylinders.length + mains.length),
  )
  const sizes = bearingSizes(document)
  return {
    angleDeg,
    bearings: bearings(parts).map((bearing) => {
      const area = projectedArea(parts, bearing, sizes)
      const load = (part: LoadPart) => {
        const signal = bearingSignal(parts, bearing, part, speed)
        const { radial, tangential } = turnedSignal(signal, bearing.stand)
        const { peak, peakAngle, mean, specific } = loadFigures(signal, parts.angle, area)
        return {
          verticalN: shown(signal.vertical),
          horizontalN: shown(signal.horizontal),
          radialN: shown(radial),
          tangentialN: shown(tangential),
          peakN: peak,
          peakAtDeg: fromSi(peakAngle, '°'),
          meanN: mean,
          peakMPa: specific === undefined ? null : specific / 1e6,
        }
      }
      const total = bearingSignal(parts, bearing, 'total', speed)
      const own = turnedSignal(total, bearing.stand)
      return {
        kind: bearing.kind,
        id: bearing.id,
        areaMm2: area === undefined ? null : area * 1e6,
        gas: include.has('gas') ? load('gas') : undefined,
        inertia: include.has('inertia') ? load('inertia') : undefined,
        total: include.has('total') ? load('total') : undefined,
        leastLoaded: {
          journal: sector(leastLoadedSector(surfaceLoad(own.radial, own.tangential, bearing.pressed))),
          block:
            bearing.kind === 'main'
              ? sector(leastLoadedSector(surfaceLoad(total.vertical, total.horizontal, bearing.pressed)))
              : null,
        },
      }
    }),
    cautions,
  }
}

const sector = ({ from, to, middle, mean, share }: Sector) => ({
  fromDeg: fromSi(from, '°'),
  toDeg: fromSi(to, '°'),
  middleDeg: fromSi(middle, '°'),
  meanN: mean,
  shareOfMean: share,
})
