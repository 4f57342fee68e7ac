import type { BodyOf } from '@/lib/contracts/operation'
import type { AnalysisAnswer, analyse as contract } from '@/lib/contracts/analyses'
import { refused } from '@/lib/errors/problem'
import { analyse } from '@/lib/mechanics/analysis'
import { readTrain } from '@/scene/model/read-train'
import { under } from './scene-document'

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
  const read = readTrain(json)
  if (!read.ok) throw refused(under('train', read.issues))
  const { train } = read
  const samples = train.cylinders.length * Math.round(((train.cycle / Math.PI) * 180) / stepDeg)
  if (samples > mostSamples) {
    const finest = Math.ceil((stepDeg * samples) / mostSamples / 0.5) * 0.5
    throw refused([
      {
        path: 'stepDeg',
        code: 'too-many-samples',
        message: `${train.cylinders.length} cylinders at every ${stepDeg}° are more figures than one answer holds.`,
        fix: `Give a step of ${finest}° or more.`,
      },
    ])
  }
  return analyse(train, { speed: (speedRpm * 2 * Math.PI) / 60, stepDeg, include, gradeMmS })
}
