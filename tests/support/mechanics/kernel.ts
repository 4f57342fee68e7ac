import { analyse, type Analysis, type AnalysisPart } from '@/lib/mechanics/analysis'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import { readTrain } from '@/scene/model/read-train'
import type { CrankTrainInput } from '@/scene/model/crank-train'

/** The program under test, asked in the units of its documents. */
export const RAD_S = (2 * Math.PI) / 60

export function trainOf(document: CrankTrainInput) {
  const read = readTrain(document)
  if (!read.ok) throw new Error(`refused: ${JSON.stringify(read.issues)}`)
  return read.train
}

/** All of the answer; a test that asks for some parts reads no others. */
export type Answer = Required<Analysis>

export function answer(
  document: CrankTrainInput,
  speedRpm: number,
  stepDeg = 1,
  include?: AnalysisPart[],
): Answer {
  return analyse(trainOf(document), { speed: speedRpm * RAD_S, stepDeg, include }) as Answer
}

/** The kernel's figures at any one crank angle. */
export function instants(document: CrankTrainInput, speedRpm: number) {
  const plan = buildPlan(trainOf(document), speedRpm * RAD_S)
  return (angleDeg: number) => {
    const out = buildInstant(plan)
    fillInstant(out, plan, (angleDeg * Math.PI) / 180)
    return out
  }
}
