import { buildRig } from '@/scene/frame/build-rig'
import { clearanceList, type ListedClearance } from '@/scene/frame/clearance-list'
import type { CrankTrainInput } from '@/scene/model/crank-train'
import { readTrain } from '@/scene/model/read-train'

/** Clearances of a document that must be good, with what they came from. */
export function clearancesOf(json: CrankTrainInput) {
  const read = readTrain(json)
  if (!read.ok) throw new Error(`refused: ${JSON.stringify(read.issues)}`)
  const { document, train } = read
  const rig = buildRig(document, train)
  return { document, train, rig, ...clearanceList(document, train, rig) }
}

/** The tightest of one kind, gap in mm and angle in degrees. */
export function tightest(list: readonly ListedClearance[], kind: ListedClearance['pair']['kind']) {
  const of = list.filter(({ pair }) => pair.kind === kind)
  if (of.length === 0) return null
  const one = of.reduce((best, next) => (next.gap < best.gap ? next : best))
  return {
    ...one,
    gapMm: one.gap * 1000,
    angleDeg: one.angle === null ? null : (one.angle * 180) / Math.PI,
  }
}
