import { cautions } from '@/lib/mechanics/analysis/cautions'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { samplesFor } from '@/lib/mechanics/loads/part-signals'
import type { Train } from '@/lib/mechanics/train'
import { toSi } from '@/lib/units/units'
import { arrivingTrain, refuseTooMany } from './arriving-train'

/** Signals × angles of one answer: some 20 MB of figures. */
const mostFigures = 1_000_000

interface Asked {
  train: unknown
  speedRpm: number
  stepDeg: number
}

/** The loads of a train that arrived, sampled for one answer; `signals` tells how many signals that will hold. */
export function loadsOf({ train: json, speedRpm, stepDeg }: Asked, signals: (train: Train) => number) {
  const { document, train } = arrivingTrain(json)
  const { sampleDeg, between } = samplesFor(stepDeg)
  refuseTooMany(train, stepDeg, signals(train), mostFigures)
  const parts = cycleParts(train, sampleDeg)
  const speed = toSi(speedRpm, 'rpm')
  /** The angles of the answer out of all samples. */
  const shown = (values: Float64Array): number[] => {
    const out: number[] = []
    for (let j = 0; j < values.length; j += between) out.push(values[j])
    return out
  }
  const count = shown(parts.angle).length
  return {
    document,
    parts,
    speed,
    shown,
    angleDeg: Array.from({ length: count }, (_, j) => j * stepDeg),
    cautions: cautions({ ...parts.plan, speed }),
  }
}
