import { bestOf } from '../best-of'
import type { Judge } from './judge'
import type { Figures } from './layout'

export interface Candidate extends Figures {
  score: number
  rest: number
}

/** Scores nearer than this are equal. */
const key = (value: number) => Math.round(value * 1e9)
const WORSE = 1e-9
/** Foremost layouts differ by more than this share of a criterion's scale: else a fine grid has thousands of them. */
const APART = 0.01

/**
 * The layouts worth keeping: the best by score (ties by what is not wished), and the foremost, those that no layout found
 * beats in one wished criterion without losing in another, a hundredth of its scale apart; of equals the better by the rest.
 */
export function archiveOf<C extends Candidate>(judge: Judge, most: number) {
  const best = bestOf<C>(most)
  const { wished, scale } = judge
  const bounds = [0, 0]
  const probe = new Float64Array(wished.length)
  let front: { candidate: C; row: Float64Array }[] = []

  /** Whether the first is at least as good as the second in all that is wished, to within `slack`; rows are in scales. */
  const covers = (one: Float64Array, other: Float64Array, slack = WORSE) => {
    for (let i = 0; i < one.length; i++) if (one[i] > other[i] + slack) return false
    return true
  }
  const rowOf = (figures: Figures, row: Float64Array) => {
    for (let i = 0; i < row.length; i++) row[i] = figures[wished[i]] / scale[wished[i]]
    return row
  }
  return {
    /** Whether nothing with a score of `score` and `rest` or more can be kept as one of the best. */
    full(score: number, rest: number): boolean {
      bounds[0] = key(score)
      bounds[1] = key(rest)
      return !best.admits(bounds)
    },
    /** Whether one of the foremost is as good as `figures` in all that is wished. */
    covered(figures: Figures): boolean {
      if (wished.length < 2) return true
      rowOf(figures, probe)
      for (let i = 0; i < front.length; i++)
        if (covers(front[i].row, probe, APART)) {
          // what covered one covers the next, more often than not
          const found = front[i]
          front[i] = front[0]
          front[0] = found
          return true
        }
      return false
    },
    add(candidate: C): void {
      best.add([key(candidate.score), key(candidate.rest)], candidate)
      if (wished.length < 2) return
      const row = rowOf(candidate, new Float64Array(wished.length))
      const exact = front.findIndex((one) => covers(one.row, row))
      if (exact >= 0) {
        if (covers(row, front[exact].row) && candidate.rest < front[exact].candidate.rest - WORSE)
          front[exact] = { candidate, row }
        return
      }
      const others = front.filter((one) => !covers(row, one.row))
      if (others.length === front.length && front.some((one) => covers(one.row, row, APART))) return
      front = [...others, { candidate, row }]
    },
    /** The foremost and, up to `most` in all, the best beside them: best first. */
    kept(): { candidate: C; foremost: boolean }[] {
      const first = bestOf<C>(Math.ceil(most / 2))
      for (const { candidate } of front) first.add([key(candidate.score), key(candidate.rest)], candidate)
      const foremost = new Set(first.kept.map(({ value }) => value))
      const others = best.kept.map(({ value }) => value).filter((one) => !foremost.has(one))
      const all = bestOf<C>(most)
      for (const one of [...foremost, ...others.slice(0, most - foremost.size)])
        all.add([key(one.score), key(one.rest)], one)
      return all.kept.map(({ value }) => ({ candidate: value, foremost: foremost.has(value) }))
    },
  }
}
