import { deadCentres } from '@/lib/mechanics/dead-centres'
import { chooseFiring } from '@/lib/mechanics/firing'
import { STATED_WITHIN } from '@/lib/mechanics/firing-choice'
import { legalFiringOrders } from '@/lib/mechanics/firing-orders'
import { rodPaths } from '@/lib/mechanics/rod-path'
import type { Train } from '@/lib/mechanics/train'
import { wrapCentred } from '@/lib/numerics/wrap'
import { refuse, type Issue } from '../issue'
import { listed, say } from '../say'

const TURN = 2 * Math.PI
const degrees = (angle: number) => say(Math.round((angle * 180e3) / Math.PI) / 1000, '°')

/** Whether the cylinders can fire as stated. Takes a train that turns. */
export function firingIssues(train: Train): Issue[] {
  const centres = deadCentres(rodPaths(train))
  const turns = Math.round(train.cycle / TURN)
  const topsOf = (index: number) =>
    Array.from({ length: turns }, (_, turn) => centres[index].top + turn * TURN)
  const stated = train.cylinders.flatMap((_, index) => statedAngle(train, index, topsOf(index)))
  if (stated.length > 0) return stated

  const choice = chooseFiring(train, centres)
  if (choice.ok) return []
  const place = train.firingOrder.indexOf(choice.breaksAt)
  const { id } = train.cylinders[choice.breaksAt]
  const nameAt = (at: number) => train.cylinders[train.firingOrder[at]].id
  const span = place > 0 ? `after ${nameAt(place - 1)} and before ${nameAt(0)} again` : 'first'
  return refuse(
    ['firingOrder', ...statedPaths(train)],
    'firing-order-impossible',
    `The firing order contradicts the crank at cylinder ${id}: it is at top dead centre at ${listed(topsOf(choice.breaksAt).map(degrees))}, and no choice of turns lets it fire ${span}.`,
    ordersThatFit(train),
  )
}

const statedPaths = (train: Train) =>
  train.cylinders.flatMap(({ firesAt }, index) =>
    firesAt === undefined ? [] : [`cylinders.${index}.firesAtDeg`],
  )

function statedAngle(train: Train, index: number, tops: number[]): Issue[] {
  const { id, firesAt } = train.cylinders[index]
  if (firesAt === undefined) return []
  const path = [`cylinders.${index}.firesAtDeg`]
  const choices = tops.map(degrees)
  if (firesAt >= train.cycle)
    return refuse(
      path,
      'out-of-range',
      `Cylinder ${id} cannot fire at ${degrees(firesAt)}: the cycle ends at ${degrees(train.cycle)}.`,
      `Give ${choices.join(' or ')}.`,
    )
  if (tops.some((top) => Math.abs(wrapCentred(firesAt - top, train.cycle)) <= STATED_WITHIN)) return []
  return refuse(
    path,
    'not-a-top-dead-centre',
    `Cylinder ${id} cannot fire at ${degrees(firesAt)}: it is at top dead centre at ${listed(choices)}.`,
    `Give ${choices.join(' or ')}, or leave it out.`,
  )
}

/** A few orders that the crank allows, even ones first. */
function ordersThatFit(train: Train): string {
  const orders = new Set<string>()
  for (const even of [true, false]) {
    if (!even && train.cylinders.length > 12) break
    for (const order of legalFiringOrders(train, { even })) {
      if (orders.size === 3) break
      orders.add(order.map((cylinder) => train.cylinders[cylinder].id).join('-'))
    }
  }
  if (orders.size === 0) return 'Change the order, or the angle of the throw.'
  return `Orders that fit: ${[...orders].join(', ')}. Or change the angle of the throw.`
}
