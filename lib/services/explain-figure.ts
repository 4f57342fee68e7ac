import type { explain as contract, ExplanationAnswer } from '@/lib/contracts/explanations'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { explain, figureIds } from '@/lib/mechanics/explain/explain'
import { sizesOf } from '@/scene/model/sizes'
import { arrivingTrain } from './arriving-train'

/** What stands behind a figure of a train, for anybody who asks. */
export function explainFigure({
  train: json,
  speedRpm,
  figure,
  ...asked
}: BodyOf<typeof contract>): ExplanationAnswer {
  const read = arrivingTrain(json)
  try {
    const told = explain(read.train, figure, {
      ...asked,
      speed: (speedRpm * 2 * Math.PI) / 60,
      sizes: sizesOf(read.document),
    })
    return { ...told, figure }
  } catch (error) {
    if (!(error instanceof RangeError)) throw error
    throw refused([
      {
        path: 'figure',
        code: 'not-explained',
        message: error.message,
        fix: `Give what is missing, or ask for another of ${figureIds.length} figures.`,
      },
    ])
  }
}
