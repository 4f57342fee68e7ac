import type { BodyOf } from '@/lib/contracts/operation'
import type { AnalysisAnswer, analyse as contract } from '@/lib/contracts/analyses'
import { analyse } from '@/lib/mechanics/analysis'
import { toSi } from '@/lib/units/units'
import { arrivingTrain, refuseTooMany } from './arriving-train'

/** Cylinders × angles of one answer: some 30 MB of figures. */
const mostSamples = 100_000

/** What a train does at a speed, for anybody who asks. */
export function analyseTrain({
  train: json,
  speedRpm,
  stepDeg,
  include,
  gradeMmS,
}: BodyOf<typeof contract>): AnalysisAnswer {
  const { train } = arrivingTrain(json)
  refuseTooMany(train, stepDeg, train.cylinders.length, mostSamples)
  return analyse(train, { speed: toSi(speedRpm, 'rpm'), stepDeg, include, gradeMmS })
}
