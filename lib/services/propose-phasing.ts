import type { PhasingAnswer, proposePhasing as contract } from '@/lib/contracts/firing'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { readPhasing } from '@/scene/model/read-phasing'
import { readTrain } from '@/scene/model/read-train'
import { under } from './scene-document'

/** The throws for a wanted firing order, with the mirrored crank's, for anybody who asks. */
export function proposePhasing({ train, order, intervalsDeg }: BodyOf<typeof contract>): PhasingAnswer {
  const read = readTrain(train)
  if (!read.ok) throw refused(under('train', read.issues))
  const phasing = readPhasing(read.document, read.train, order, intervalsDeg)
  if (!phasing.ok) throw refused(phasing.issues)
  return { proposal: phasing.proposal, mirror: phasing.mirror.ok ? phasing.mirror.proposal : null }
}
