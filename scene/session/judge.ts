import type { CrankTrain } from '@/scene/model/crank-train'
import { readTrain, type Issue, type ReadTrain } from '@/scene/model/read-train'

export type { Issue } from '@/scene/model/read-train'

const read = new WeakMap<CrankTrain, ReadTrain>()

/** Reads a document once, however often it is asked for. */
export function readOnce(document: CrankTrain): ReadTrain {
  let answer = read.get(document)
  if (!answer) {
    answer = readTrain(document)
    read.set(document, answer)
  }
  return answer
}

/** Why a document cannot run; empty where it can. */
export function judge(document: CrankTrain): Issue[] {
  const answer = readOnce(document)
  return answer.ok ? [] : answer.issues
}
