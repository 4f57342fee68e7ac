import type { FiringOrdersAnswer, listFiringOrders as contract } from '@/lib/contracts/firing'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { MOST_CYLINDERS, rankedFiringOrders } from '@/lib/mechanics/firing-ranking'
import { fromSi } from '@/lib/units/units'
import { readTrain } from '@/scene/model/read-train'
import { under } from './scene-document'

const degrees = (angle: number) => fromSi(angle, '°')

/** Every legal firing order of a train, for anybody who asks. */
export function listFiringOrders({ train: json, even }: BodyOf<typeof contract>): FiringOrdersAnswer {
  const read = readTrain(json)
  if (!read.ok) throw refused(under('train', read.issues))
  const { train } = read
  const { length } = train.cylinders
  if (!even && length > MOST_CYLINDERS)
    throw refused([
      {
        path: 'even',
        code: 'too-many-cylinders',
        message: `All orders are looked through up to ${MOST_CYLINDERS} cylinders; this train has ${length}.`,
        fix: 'Ask for the even orders alone.',
      },
    ])
  const { orders, found, complete } = rankedFiringOrders(train, { even })
  return {
    orders: orders.map((ranked) => ({
      order: ranked.order.map((cylinder) => train.cylinders[cylinder].id),
      intervalsDeg: ranked.intervals.map(degrees),
      spreadDeg: degrees(ranked.spread),
      rmsDeg: degrees(ranked.rms),
      sameBank: ranked.sameBank,
      sameThrow: ranked.sameThrow,
      adjacentThrow: ranked.adjacentThrow,
      sameOrAdjacentThrow: ranked.sameThrow + ranked.adjacentThrow,
      collectorSpreadDeg: degrees(ranked.collectorSpread),
    })),
    found,
    complete,
  }
}
