import { wrap, wrapCentred } from '@/lib/numerics/wrap'
import { deadCentres } from './dead-centres'
import { EVEN_WITHIN } from './firing'
import { SAME } from './firing-choice'
import { rodPaths } from './rod-path'
import type { Train } from './train'

const TURN = 2 * Math.PI

/**
 * Every firing order that the crank allows, as cylinder indices: each cyclic order once, beginning with the first
 * cylinder, no two cylinders at once unless one top dead centre has more of them than the cycle has turns; then they stand
 * in the order of the train. With `even`, only those whose intervals are equal within half a degree.
 *
 * Each cylinder can fire at its top dead centre in either turn of a four-stroke cycle; the first cylinder's is fixed,
 * since firing everything a turn later is the same order. Even orders fill one slot of the cycle after the other, so
 * they cost no more than there are of them; all orders cost 2^(cylinders − 1) choices: take from the generator what is
 * wanted.
 */
export function* legalFiringOrders(train: Train, { even }: { even: boolean }): Generator<number[]> {
  const centres = deadCentres(rodPaths(train))
  const turns = Math.round(train.cycle / TURN)
  /** Firing angles open to each cylinder, from the first cylinder's. */
  const open = centres.map(({ top }) => {
    const angle = wrap(top - centres[0].top, TURN)
    return Array.from({ length: turns }, (_, turn) => angle + turn * TURN)
  })
  yield* even ? evenOrders(open, train.cycle) : allOrders(open, train.cycle)
}

function* evenOrders(open: readonly number[][], cycle: number): Generator<number[]> {
  const spacing = cycle / open.length
  const slots = open.map((angles) =>
    angles
      .filter((angle) => Math.abs(angle - spacing * Math.round(angle / spacing)) <= EVEN_WITHIN)
      .map((angle) => Math.round(angle / spacing) % open.length)
      .sort((one, other) => one - other),
  )
  // cylinders that can fire at the same slots must be as many as those: then no choice below leads astray
  const fit = slots.every(
    (own) => own.length > 0 && slots.filter((other) => other.join() === own.join()).length === own.length,
  )
  if (fit) yield* filled(slots, [0])
}

function* filled(slots: readonly number[][], order: number[]): Generator<number[]> {
  if (order.length === slots.length) yield order
  for (let cylinder = 1; cylinder < slots.length; cylinder++)
    if (slots[cylinder].includes(order.length) && !order.includes(cylinder))
      yield* filled(slots, [...order, cylinder])
}

function* allOrders(open: readonly number[][], cycle: number): Generator<number[]> {
  const seen = new Set<string>()
  const crowded = open.map(
    ([own]) => open.filter(([top]) => Math.abs(wrapCentred(top - own, TURN)) <= SAME).length > cycle / TURN,
  )
  for (const angles of choices([[0], ...open.slice(1)])) {
    const order = angles.map((_, cylinder) => cylinder).sort((one, other) => angles[one] - angles[other])
    const apart = order.every((cylinder, place) => {
      const next = place + 1 < order.length ? angles[order[place + 1]] : cycle
      return next - angles[cylinder] > SAME || crowded[cylinder]
    })
    const key = order.join()
    if (apart && !seen.has(key)) {
      seen.add(key)
      yield order
    }
  }
}

function* choices(open: readonly number[][], taken: number[] = []): Generator<number[]> {
  if (taken.length === open.length) yield taken
  else for (const angle of open[taken.length]) yield* choices(open, [...taken, angle])
}
