import type { archiveOf, Candidate } from './archive'
import type { Judge } from './judge'
import { criteria, type Figures, type LayoutRequest } from './layout'
import { balanceOf } from './phasing-balance'
import { orderSearch, type Admits, type Found } from './phasing-orders'
import type { Space } from './space'

/** Orders of one phasing that are told apart and kept. */
const MOST_ORDERS = 6
const SAME = 1e-9

/** A layout worth keeping, as little of it as the search needs. */
export interface FoundLayout extends Candidate {
  space: Space
  units: Int32Array
  /** See `orderSearch`. */
  late: number
  sameThrow: number
  alike: number
}

const balanceCriteria = ['firstForce', 'firstCouple', 'secondForce', 'secondCouple', 'counterweight'] as const
const noUnits = new Int32Array(0)

/**
 * Evaluates one phasing of a space after another into the archive; answers how many whole orders were reached. Orders are left
 * early that break a limit, and those that neither are among the best by score nor better than another order
 * of the phasing in something wished.
 */
export function phasingVisitor(
  request: LayoutRequest,
  space: Space,
  judge: Judge,
  archive: ReturnType<typeof archiveOf<FoundLayout>>,
): (units: Int32Array) => number {
  const balance = balanceOf(space, request)
  const orders = orderSearch(space)
  const figures = Object.fromEntries(criteria.map((criterion) => [criterion, 0])) as Figures
  const [wantsEven, wantsBanks, wantsApart] = (['unevenness', 'sameBank', 'nearThrow'] as const).map(
    (criterion) => judge.wished.includes(criterion),
  )
  let local: FoundLayout[] = []
  let [score, rest, foremost] = [0, 0, false]

  const scoreWith = (unevenness: number, sameBank: number, nearThrow: number) =>
    score +
    judge.cost('unevenness', unevenness) +
    judge.cost('sameBank', sameBank) +
    judge.cost('nearThrow', nearThrow)
  const restWith = (unevenness: number, sameBank: number, nearThrow: number) =>
    rest +
    judge.rest('unevenness', unevenness) +
    judge.rest('sameBank', sameBank) +
    judge.rest('nearThrow', nearThrow)
  /** Whether an order of this phasing is at least as good in everything about orders that is wished. */
  const outdone = (unevenness: number, sameBank: number, nearThrow: number) => {
    for (let i = 0; i < local.length; i++) {
      const one = local[i]
      if (
        (!wantsEven || one.unevenness <= unevenness + SAME) &&
        (!wantsBanks || one.sameBank <= sameBank) &&
        (!wantsApart || one.nearThrow <= nearThrow)
      )
        return true
    }
    return false
  }

  const admits: Admits = (unevenness, sameBank, nearThrow) => {
    if (!judge.keeps('unevenness', unevenness)) return false
    if (!judge.keeps('sameBank', sameBank) || !judge.keeps('nearThrow', nearThrow)) return false
    if (foremost && !outdone(unevenness, sameBank, nearThrow)) {
      figures.unevenness = unevenness
      figures.sameBank = sameBank
      figures.nearThrow = nearThrow
      if (!archive.covered(figures)) return true
    }
    return !archive.full(
      scoreWith(unevenness, sameBank, nearThrow),
      restWith(unevenness, sameBank, nearThrow),
    )
  }
  const found: Found = ({ unevenness, sameBank, nearThrow, sameThrow }, late) => {
    for (let i = 0; i < local.length; i++) {
      const one = local[i]
      if (
        Math.abs(one.unevenness - unevenness) < SAME &&
        one.sameBank === sameBank &&
        one.nearThrow === nearThrow &&
        one.sameThrow === sameThrow
      ) {
        one.alike++
        return
      }
    }
    local.push({
      ...figures,
      unevenness,
      sameBank,
      nearThrow,
      sameThrow,
      space,
      units: noUnits,
      late,
      alike: 1,
      score: scoreWith(unevenness, sameBank, nearThrow),
      rest: restWith(unevenness, sameBank, nearThrow),
    })
  }

  return (units) => {
    const own = balance(units)
    score = 0
    rest = 0
    figures.unevenness = figures.sameBank = figures.nearThrow = 0
    for (const criterion of balanceCriteria) {
      const figure = own[criterion]
      if (!judge.keeps(criterion, figure)) return 0
      figures[criterion] = figure
      score += judge.cost(criterion, figure)
      rest += judge.rest(criterion, figure)
    }
    foremost = !archive.covered(figures)
    if (!foremost && archive.full(score, rest)) return 0
    local = []
    const reached = orders.search(units, admits, found)
    if (local.length === 0) return reached
    const copy = Int32Array.from(units)
    local.sort((one, other) => one.score - other.score || one.rest - other.rest)
    for (const one of local.slice(0, MOST_ORDERS)) archive.add({ ...one, units: copy })
    return reached
  }
}
