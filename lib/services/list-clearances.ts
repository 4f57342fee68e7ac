import type { ClearancesAnswer, listClearances as contract } from '@/lib/contracts/clearances'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { buildRig } from '@/scene/frame/build-rig'
import { clearanceList } from '@/scene/frame/clearance-list'
import { clearanceMends } from '@/scene/frame/clearance-mends'
import { clearanceAssumption, clearanceSentence } from '@/scene/frame/clearance-words'
import { readTrain } from '@/scene/model/read-train'
import { under } from './scene-document'

/** The clearances of a train, for anybody who asks. */
export function listClearances({ train: json }: BodyOf<typeof contract>): ClearancesAnswer {
  const read = readTrain(json)
  if (!read.ok) throw refused(under('train', read.issues))
  const { document, train } = read
  const rig = buildRig(document, train)
  const { clearances, notKnown } = clearanceList(document, train, rig)
  return {
    notKnown,
    clearances: clearances.map((one) => ({
      kind: one.pair.kind,
      parts: one.parts,
      leastMm: one.gap * 1000,
      angleDeg: one.angle === null ? null : (one.angle * 180) / Math.PI,
      limitMm: one.limit * 1000,
      status: one.status,
      message: clearanceSentence(one, 'si'),
      assumes: clearanceAssumption[one.pair.kind],
      mends: one.status === 'clear' ? [] : clearanceMends(document, rig, one, 'si'),
    })),
  }
}
