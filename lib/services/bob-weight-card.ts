import type { bobWeightCard as contract } from '@/lib/contracts/balance'
import type { AnswerOf, BodyOf } from '@/lib/contracts/operation'
import { bobWeightCards } from '@/lib/mechanics/balance/bob-weight-card'
import { pistonParts } from '@/scene/model/piston-parts'
import { arrivingTrain } from './arriving-train'

/** What to hang on each throw on the balancing machine. */
export function bobWeightCard(body: BodyOf<typeof contract>): AnswerOf<typeof contract> {
  const { document, train } = arrivingTrain(body.train)
  return {
    throws: bobWeightCards(train, pistonParts(document)).map((card) => ({
      throw: card.throw,
      rows: card.rows.map(({ part, moves, quantity, each, total, cylinders }) => ({
        part,
        moves,
        quantity,
        eachKg: each,
        totalKg: total,
        cylinders,
      })),
      reciprocatingKg: card.reciprocating,
      rotatingKg: card.rotating,
      oilKg: card.oil,
      totalKg: card.total,
      factor: card.factor,
    })),
  }
}
