import { EVEN_WITHIN } from '../firing'
import { archiveOf } from './archive'
import { judgeOf, missJudgeOf, type Judge } from './judge'
import { criteria, type Criterion, type Layout, type LayoutRequest } from './layout'
import { layoutOf } from './layout-of'
import { phasingVisitor, type FoundLayout } from './phasing-visitor'
import { beenThere, phasings } from './phasings'
import { evenSlots, regularDivisions, spaces } from './space'

export const MOST_KEPT = 200
export const MOST_CYLINDERS = 12
/** Phasings between two reports. */
const STRIDE = 1024

/** 0…1, and what has been gone through. */
export interface LayoutProgress {
  progress: number
  phasings: number
  orders: number
}

export interface NearestMiss {
  layout: Layout
  /** Wishes whose limit it misses. */
  missed: Criterion[]
  /** Wishes that no layout of the search fulfils, whatever becomes of the others. */
  impossible: Criterion[]
}

export interface LayoutSearch {
  /** Best first. */
  layouts: Layout[]
  /** Phasings and whole orders evaluated, symmetrical ones taken out. */
  phasings: number
  orders: number
  /** Parts of a turn that throws were placed on: by even firing, and by regular grids. */
  naturalDivisions: number
  regularDivisions: number[]
  /** True where the search stopped at its limit of phasings. */
  capped: boolean
  /** Where nothing fulfils the limits of all wishes; null also when no phasing lets the cylinders fire one by one. */
  miss: NearestMiss | null
}

export interface LayoutLimits {
  /** The most layouts that are kept, up to 200. */
  keep?: number
  /** The most phasings that are gone through. */
  mostPhasings?: number
}

/**
 * Looks through phasings on grids, and through the firing orders of each, for layouts that fulfil wishes: throws on the parts
 * of a turn that even firing calls for and on regular grids (5° to 180°, as fine as the number of throws allows), for every
 * bank angle and split asked for. Mirrored and end-for-end phasings are gone through once. An order is every cylinder at its
 * top dead centre in one of the cycle's turns, no two at once. Ranked by score, then by what was not wished; the same request
 * gives the same answer. Yields now and then; whoever steps it no further has cancelled it.
 * Throws RangeError for a request that no engine of equal throws fits.
 */
export function* findLayouts(
  request: LayoutRequest,
  { keep = MOST_KEPT, mostPhasings = Infinity }: LayoutLimits = {},
): Generator<LayoutProgress, LayoutSearch> {
  refuse(request)
  const found = yield* search(request, judgeOf(request), Math.min(keep, MOST_KEPT), mostPhasings)
  return {
    ...found,
    naturalDivisions: evenSlots(request).slots,
    regularDivisions: evenOnly(judgeOf(request)) ? [] : regularDivisions(request),
    miss: found.layouts.length > 0 ? null : yield* nearestMiss(request, mostPhasings),
  }
}

function refuse({ cylinders, rodsPerThrow, bankAngles, splits }: LayoutRequest) {
  if (!Number.isInteger(cylinders) || cylinders < 1 || cylinders > MOST_CYLINDERS)
    throw new RangeError(`A search takes 1 to ${MOST_CYLINDERS} cylinders, not ${cylinders}.`)
  if (rodsPerThrow === 2 && (bankAngles.length === 0 || cylinders % 2 === 1))
    throw new RangeError('Two rods on a throw need two banks and an even number of cylinders.')
  if (splits.length === 0) throw new RangeError('A search needs a split angle, 0 for common pins.')
  if (rodsPerThrow === 1 && splits.some((split) => split !== 0))
    throw new RangeError('Only a throw with two rods has a pin to split.')
}

/** An engine that fires evenly stands on the grid of even firing: where nothing else will do, regular ones add nothing. */
const evenOnly = (judge: Judge) => !judge.keeps('unevenness', 2 * EVEN_WITHIN)

type Searched = Pick<LayoutSearch, 'layouts' | 'phasings' | 'orders' | 'capped'>

function* search(
  request: LayoutRequest,
  judge: Judge,
  keep: number,
  mostPhasings: number,
): Generator<LayoutProgress, Searched> {
  const archive = archiveOf<FoundLayout>(judge, keep)
  const all = spaces(request).filter(({ natural }) => natural || !evenOnly(judge))
  const counts = { phasings: 0, orders: 0 }
  let capped = false
  for (let index = 0; index < all.length && !capped; index++) {
    const space = all[index]
    const visit = phasingVisitor(request, space, judge, archive)
    const within = (units: Int32Array) =>
      space.throws < 2
        ? 0
        : (units[1] + (space.throws > 2 ? units[2] / space.divisions : 0)) / space.divisions
    const visited = beenThere(space, all.slice(0, index))
    for (const units of phasings(space)) {
      if (visited(units)) continue
      if (counts.phasings === mostPhasings) {
        capped = true
        break
      }
      counts.phasings++
      counts.orders += visit(units)
      if (counts.phasings % STRIDE === 0) yield { progress: (index + within(units)) / all.length, ...counts }
    }
  }
  yield { progress: 1, ...counts }
  const layouts = archive.kept().map(({ candidate, foremost }) => layoutOf(request, candidate, foremost))
  return { layouts, ...counts, capped }
}

/** Which limits exclude everything, and the layout that misses them by least. */
function* nearestMiss(
  request: LayoutRequest,
  mostPhasings: number,
): Generator<LayoutProgress, NearestMiss | null> {
  const limited = criteria.filter((criterion) => request.wishes[criterion]?.atMost !== undefined)
  const first = function* (wished: readonly Criterion[]) {
    const { layouts } = yield* search(request, missJudgeOf(request, wished), 1, mostPhasings)
    return layouts.at(0)
  }
  const layout = yield* first(limited)
  if (!layout) return null
  const judge = judgeOf(request)
  const missed = limited.filter((criterion) => !judge.keeps(criterion, layout[criterion]))
  const impossible: Criterion[] = []
  for (const criterion of missed)
    if (((yield* first([criterion]))?.score ?? 1) > 0) impossible.push(criterion)
  return { layout, missed, impossible }
}
