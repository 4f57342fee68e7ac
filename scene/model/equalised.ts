import { trainSummary } from '@/lib/mechanics/analysis/summary'
import { buildPlan } from '@/lib/mechanics/plan'
import { fromSi, toSi } from '@/lib/units/units'
import type { CrankTrain } from './crank-train'
import type { Compared } from './compare-trains'
import { scaledDocument, similarityFactor } from './scaled-document'
import { toTrain } from './to-train'

/** How engines are made comparable: sizes and speeds as they are, or those of the first. */
export interface Equality {
  size: 'own' | 'displacement'
  speed: 'own' | 'rpm' | 'piston-speed'
}

const summary = (document: CrankTrain, speedRpm: number) =>
  trainSummary(buildPlan(toTrain(document), toSi(speedRpm, 'rpm')))

/**
 * The engines with the first one's displacement (by similarity, see `scaledDocument`) and its speed, or the speed that
 * gives its mean piston speed. The first one is never changed.
 */
export function equalised(compared: readonly Compared[], { size, speed }: Equality): Compared[] {
  const [first] = compared
  if (!first) return []
  const model = summary(first.document, first.speedRpm)
  return compared.map((each) => {
    if (each === first) return each
    const document = size === 'own' ? each.document : sized(each.document, model.displacementCc)
    if (speed === 'own') return { document, speedRpm: each.speedRpm }
    if (speed === 'rpm') return { document, speedRpm: first.speedRpm }
    const perRpm = summary(document, 1).meanPistonSpeedMS
    return { document, speedRpm: fromSi(toSi(model.meanPistonSpeedMS / perRpm, 'rpm'), 'rpm') }
  })
}

const sized = (document: CrankTrain, displacementCc: number) =>
  scaledDocument(document, similarityFactor(summary(document, 0).displacementCc, displacementCc))
