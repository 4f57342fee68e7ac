import type { BodyOf } from '@/lib/contracts/operation'
import type { SpeedSweepAnswer, speedSweep as contract } from '@/lib/contracts/speed-sweeps'
import { refused } from '@/lib/errors/problem'
import { cautions } from '@/lib/mechanics/analysis/cautions'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { buildSweep, sweepPoint } from '@/lib/mechanics/loads/speed-sweep'
import { sweepBounds, sweepSpeeds } from '@/lib/mechanics/loads/sweep-bounds'
import { fromSi, standardGravity, toSi } from '@/lib/units/units'
import { arrivingTrain } from './arriving-train'

/** Loads and power of a train over a range of speeds, for anybody who asks. */
export function sweepTrainSpeeds(asked: BodyOf<typeof contract>): SpeedSweepAnswer {
  const { train } = arrivingTrain(asked.train)
  const { fromRpm, toRpm, count } = asked
  const sweep = buildSweep(cycleParts(train))
  const usual = sweepBounds(train, sweep.longestTravel)
  const to = toRpm === undefined ? usual.to : toSi(toRpm, 'rpm')
  const from = fromRpm === undefined ? Math.min(usual.from, to / 2) : toSi(fromRpm, 'rpm')
  if (from >= to)
    throw refused([
      {
        path: 'fromRpm',
        code: 'sweep-empty',
        message: `The sweep would end at ${Math.round(fromSi(to, 'rpm'))} rpm, below where it begins.`,
        fix: 'Give toRpm as well, or a lower beginning.',
      },
    ])
  return {
    redlineRpm: usual.redline === undefined ? null : fromSi(usual.redline, 'rpm'),
    bounds: {
      from: fromRpm === undefined ? usual.fromIs : 'asked',
      to: toRpm === undefined ? usual.toIs : 'asked',
    },
    points: sweepSpeeds(from, to, count).map((speed) => {
      const point = sweepPoint(sweep, speed)
      return {
        speedRpm: fromSi(speed, 'rpm'),
        force1N: point.force1,
        force2N: point.force2,
        couple1Nm: point.couple1,
        couple2Nm: point.couple2,
        accelerationMS2: point.acceleration,
        accelerationG: point.acceleration / standardGravity,
        rodTensionN: point.rodTension,
        rodCompressionN: point.rodCompression,
        pinN: point.pin,
        mainN: point.main,
        meanPistonSpeedMS: point.meanPistonSpeed,
        meanTorqueNm: point.meanTorque,
        powerKW: point.power / 1000,
      }
    }),
    cautions: cautions({ ...sweep.parts.plan, speed: to }),
  }
}
