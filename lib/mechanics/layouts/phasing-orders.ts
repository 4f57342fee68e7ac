import { SAME } from '../firing-choice'
import { bankOf, topCentre, type Space } from './space'

const TURN = 2 * Math.PI
/** Intervals are compared within rounding. */
const ROUNDING = 1e-9

/** What an order, or the beginning of one, is judged by: none of it falls as more cylinders are put in place. */
export interface OrderFigures {
  /** Greatest less least interval, rad. */
  unevenness: number
  sameBank: number
  sameThrow: number
  /** On the same or the next throw. */
  nearThrow: number
}

/** Whether something that is no better than this can still matter. */
export type Admits = (unevenness: number, sameBank: number, nearThrow: number) => boolean
/** `late` has a bit for each cylinder that fires in the second turn. */
export type Found = (figures: OrderFigures, late: number) => void

/** A beginning: its last cylinder in either turn and the first of the second, −1 for none; its intervals, counts and `late`. */
type Close = (
  last0: number,
  last1: number,
  first1: number,
  most: number,
  least: number,
  sums: number,
  late: number,
) => void
type Place = (rank: number, ...beginning: Parameters<Close>) => void

/**
 * Goes through the firing orders of phasings of one space: every cylinder fires at its top dead centre in one of the
 * cycle's turns, the first cylinder in the first, no two at once. Cylinders are put in place by rising top dead centre, so
 * intervals and successions within each turn are known as soon as a cylinder is placed, and a beginning that
 * `admits` turns down is left with all that follows from it. Returns how many whole orders were reached.
 */
export function orderSearch(space: Space) {
  const { cylinders, rodsPerThrow: rods, cycle } = space
  const twoTurns = cycle > TURN * 1.5
  const tops = new Float64Array(cylinders)
  const ranked = Array.from({ length: cylinders }, (_, cylinder) => cylinder)
  const bank = ranked.map((cylinder) => bankOf(space, Math.floor(cylinder / rods), cylinder % rods))
  const counted = space.bankAngle === null ? 0 : 1
  const bay = ranked.map((cylinder) => Math.floor(cylinder / rods))
  const figures: OrderFigures = { unevenness: 0, sameBank: 0, sameThrow: 0, nearThrow: 0 }
  const bankPairs = new Uint8Array(cylinders * cylinders)
  const throwPairs = new Uint8Array(cylinders * cylinders)
  const nearPairs = new Uint8Array(cylinders * cylinders)
  for (let one = 0; one < cylinders; one++)
    for (let next = 0; next < cylinders; next++) {
      if (one === next) continue
      const away = Math.abs(bay[one] - bay[next])
      bankPairs[one * cylinders + next] = bank[one] === bank[next] ? counted : 0
      throwPairs[one * cylinders + next] = away === 0 ? 1 : 0
      nearPairs[one * cylinders + next] = away <= 1 ? 1 : 0
    }

  let admits: Admits
  let found: Found
  let reached = 0

  const close: Close = (last0, last1, first1, most, least, sums, late) => {
    const first = ranked[0]
    const end = last1 < 0 ? last0 : last1
    const seam = cycle - tops[end] - (last1 < 0 ? 0 : TURN)
    let [pairs, widest, narrowest] = [sums + pairOf(end, first), Math.max(most, seam), Math.min(least, seam)]
    if (last1 >= 0) {
      const between = tops[first1] + TURN - tops[last0]
      pairs += pairOf(last0, first1)
      widest = Math.max(widest, between)
      narrowest = Math.min(narrowest, between)
    }
    if (narrowest <= SAME) return
    const spread = widest - narrowest
    figures.unevenness = spread < ROUNDING ? 0 : spread
    figures.sameBank = pairs & 255
    figures.sameThrow = (pairs >> 8) & 255
    figures.nearThrow = pairs >> 16
    reached++
    if (admits(figures.unevenness, figures.sameBank, figures.nearThrow)) found(figures, late)
  }
  /** The three counts of one succession, in one number. */
  const pairOf = (one: number, next: number) => {
    const at = one * cylinders + next
    return bankPairs[at] + (throwPairs[at] << 8) + (nearPairs[at] << 16)
  }

  const place: Place = (rank, last0, last1, first1, most, least, sums, late) => {
    if (rank === cylinders) return close(last0, last1, first1, most, least, sums, late)
    const cylinder = ranked[rank]
    for (let turn = 0; turn < (twoTurns && rank > 0 ? 2 : 1); turn++) {
      const before = turn === 0 ? last0 : last1
      let [widest, narrowest, pairs] = [most, least, sums]
      if (before >= 0) {
        const gap = tops[cylinder] - tops[before]
        if (gap <= SAME) continue
        if (gap > widest) widest = gap
        if (gap < narrowest) narrowest = gap
        pairs += pairOf(before, cylinder)
        const spread = widest - narrowest
        if (!admits(spread < ROUNDING ? 0 : spread, pairs & 255, pairs >> 16)) continue
      }
      if (turn === 0) place(rank + 1, cylinder, last1, first1, widest, narrowest, pairs, late)
      else
        place(
          rank + 1,
          last0,
          cylinder,
          first1 < 0 ? cylinder : first1,
          widest,
          narrowest,
          pairs,
          late | (1 << cylinder),
        )
    }
  }

  const search = (units: ArrayLike<number>, admitted: Admits, onFound: Found): number => {
    admits = admitted
    found = onFound
    reached = 0
    setTops(units)
    ranked.sort((one, other) => tops[one] - tops[other] || one - other)
    place(0, -1, -1, -1, 0, cycle, 0, 0)
    return reached
  }
  const setTops = (units: ArrayLike<number>) => {
    for (let cylinder = 0; cylinder < cylinders; cylinder++) {
      const k = Math.floor(cylinder / rods)
      tops[cylinder] = topCentre(space, k, units[k], cylinder % rods)
    }
  }

  /** The order that `late` stands for, with its intervals. */
  const orderOf = (units: ArrayLike<number>, late: number) => {
    setTops(units)
    const at = (cylinder: number) => tops[cylinder] + (late & (1 << cylinder) ? TURN : 0)
    const order = tops.length === 1 ? [0] : Array.from(tops.keys()).sort((one, other) => at(one) - at(other))
    const intervals = order.map((cylinder, index) =>
      index + 1 < order.length ? at(order[index + 1]) - at(cylinder) : cycle - at(cylinder),
    )
    return { order, intervals }
  }
  return { search, orderOf }
}
