import { mirroredOrder, phasingFromOrder } from '@/lib/mechanics/phasing-from-order'
import type { Train } from '@/lib/mechanics/train'
import { fromSi, toSi } from '@/lib/units/units'
import { orderIssues } from './checks/references'
import type { CrankTrain } from './crank-train'
import { refuse, type Issue } from './issue'
import { say } from './say'

/** Throws that fire in an order. */
export interface PhasingProposal {
  order: string[]
  throws: { id: string; angleDeg: number }[]
}

export type Proposed = { ok: true; proposal: PhasingProposal } | { ok: false; issues: Issue[] }

/** The throws for the order, and for the same order backwards: the mirrored crank. */
export type ReadPhasing =
  { ok: true; proposal: PhasingProposal; mirror: Proposed } | { ok: false; issues: Issue[] }

/** Degrees that add up within this are a cycle. */
const SUM_WITHIN = 0.5

/**
 * Throw angles from a wanted order of the cylinders, even unless intervals are given; or why there are none. Paths of issues are
 * `order` and `intervalsDeg`.
 */
export function readPhasing(
  document: CrankTrain,
  train: Train,
  order: readonly string[],
  intervalsDeg?: readonly number[],
): ReadPhasing {
  const issues = [
    ...orderIssues({ firingOrder: [...order], cylinders: document.cylinders }).map((issue) => ({
      ...issue,
      path: 'order',
    })),
    ...(intervalsDeg ? intervalIssues(document, intervalsDeg) : []),
  ]
  if (issues.length > 0) return { ok: false, issues }
  const places = order.map((name) => document.cylinders.findIndex(({ id }) => id === name))
  const proposed = propose(document, train, places, intervalsDeg)
  if (!proposed.ok) return proposed
  const backwards = intervalsDeg && [...intervalsDeg].reverse()
  return { ...proposed, mirror: propose(document, train, mirroredOrder(places), backwards) }
}

function propose(
  document: CrankTrain,
  train: Train,
  order: readonly number[],
  intervalsDeg?: readonly number[],
): Proposed {
  const intervals = intervalsDeg?.map((interval) => toSi(interval, '°'))
  const phasing = phasingFromOrder(train, order, intervals)
  const nameOf = (cylinder: number) => document.cylinders[cylinder].id
  if (phasing.ok) {
    const throws = document.throws.map(({ id }, index) => ({
      id,
      angleDeg: whole(phasing.throwAngles[index]),
    }))
    return { ok: true, proposal: { order: order.map(nameOf), throws } }
  }
  const [one, other] = phasing.cylinders
  const apart = say(Math.round(fromSi(phasing.apart, '°') * 100) / 100, '°')
  return {
    ok: false,
    issues: refuse(
      ['order'],
      'throw-in-two-places',
      `Cylinders ${nameOf(one)} and ${nameOf(other)} share throw ${document.throws[phasing.throw].id}, and the order ${order.map(nameOf).join('-')} wants it in two places, ${apart} apart.`,
      `Give each a throw of its own, such as a pin split by ${apart}, or take an order that the shared throws allow.`,
    ),
  }
}

/** Degrees as a document keeps them, 0 ≤ x < 360. */
const whole = (angle: number) => Number(fromSi(angle, '°').toFixed(6)) % 360

function intervalIssues({ cycle, cylinders }: CrankTrain, intervalsDeg: readonly number[]): Issue[] {
  const whole = cycle === 'two-stroke' ? 360 : 720
  const sum = intervalsDeg.reduce((all, interval) => all + interval, 0)
  const about = (message: string, fix: string) =>
    refuse(['intervalsDeg'], 'intervals-do-not-close', message, fix)
  if (intervalsDeg.length !== cylinders.length)
    return about(
      `${intervalsDeg.length} intervals for ${cylinders.length} cylinders.`,
      'Give one from each cylinder of the order to the next, the last back to the first.',
    )
  if (intervalsDeg.some((interval) => !(interval >= 0)))
    return about('An interval cannot be less than 0°.', 'Give the angle from one firing to the next.')
  if (Math.abs(sum - whole) > SUM_WITHIN)
    return about(
      `Intervals add up to ${say(sum, '°')}, must be ${whole}°: one ${cycle} cycle.`,
      'Change one of them, or leave them out for an even order.',
    )
  return []
}
