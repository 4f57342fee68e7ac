import type { CrankTrain } from './crank-train'
import { say } from './say'

export interface Point {
  angleDeg: number
  bar: number
}

export type WholeCycle =
  | { ok: true; angleDeg: number[]; pressureBar: number[]; understood: string[] }
  | { ok: false; message: string; fix: string }

/** A file whose first angle is not negative counts from 0 on. */
export const fromZero = (first: number) => first > -1e-6

/** How far from its top dead centre the highest pressure of a cycle may stand, degrees. */
const PEAK_WITHIN = 90

/**
 * Points that rise over one cycle, turned so that they begin half a cycle before firing top dead centre. The point that
 * ends the cycle is its first again and left out; where none stands at the beginning one is put there, on the straight line
 * between its neighbours, so that the pressure is the same as before.
 */
export function wholeCycle(
  points: readonly Point[],
  stated: 'firing' | 'gas-exchange' | null,
  cycle: CrankTrain['cycle'],
): WholeCycle {
  const span = cycle === 'four-stroke' ? 720 : 360
  const half = span / 2
  if (points.length < 3)
    return {
      ok: false,
      message: `The file has ${say(points.length, '')} points: too few for a cycle.`,
      fix: `Give points over ${span}°.`,
    }
  const zeroFirst = fromZero(points[0].angleDeg)
  const [least, greatest] = zeroFirst ? [0, span] : [-half, half]
  const [first, last] = [points[0].angleDeg, points[points.length - 1].angleDeg]
  const widest = Math.max(...points.slice(1).map(({ angleDeg }, i) => angleDeg - points[i].angleDeg))
  const missing = first - least + (greatest - last)
  if (missing > 2 * widest)
    return {
      ok: false,
      message: `Rows run from ${say(first, '°')} to ${say(last, '°')}: ${say(Number(missing.toFixed(3)), '°')} of the ${span}° of a ${cycle} cycle are missing, where rows stand ${say(Number(widest.toFixed(3)), '°')} apart at most.`,
      fix: `Give rows from ${say(least, '°')} to ${say(greatest, '°')}.`,
    }
  const zero = zeroFirst && cycle === 'four-stroke' ? (stated ?? guessed(points)) : 'firing'
  if (zero === null)
    return {
      ok: false,
      message:
        'Angles run from 0 to 720° and the header does not say what 0 is; the highest pressure stands near no top dead centre.',
      fix: 'Write “deg from firing TDC” or “deg from gas exchange TDC” in the header.',
    }
  const understood =
    zeroFirst && cycle === 'four-stroke' && stated === null
      ? [
          `The header does not say what 0° is: taken as the ${zero === 'firing' ? 'firing' : 'gas exchange'} top dead centre, by the highest pressure at ${say(peakOf(points).angleDeg, '°')}.`,
        ]
      : []
  return { ok: true, ...turned(points, zero === 'firing' ? 0 : half, span), understood }
}

const peakOf = (points: readonly Point[]) =>
  points.reduce((best, point) => (point.bar > best.bar ? point : best))

function guessed(points: readonly Point[]): 'firing' | 'gas-exchange' | null {
  const { angleDeg } = peakOf(points)
  if (Math.min(angleDeg, 720 - angleDeg) <= PEAK_WITHIN) return 'firing'
  return Math.abs(angleDeg - 360) <= PEAK_WITHIN ? 'gas-exchange' : null
}

/** The points counted from `fires`, from −half a span on. */
function turned(points: readonly Point[], fires: number, span: number) {
  const half = span / 2
  const once = points.filter(({ angleDeg }, i) => i === 0 || angleDeg - points[0].angleDeg < span - 1e-6)
  const moved = once
    .map(({ angleDeg, bar }) => {
      const from = angleDeg - fires
      return { angleDeg: from >= half ? from - span : from < -half - 1e-6 ? from + span : from, bar }
    })
    .sort((a, b) => a.angleDeg - b.angleDeg)
  const first = moved[0]
  if (first.angleDeg <= -half + 1e-6) first.angleDeg = -half
  else {
    const last = moved[moved.length - 1]
    const share = (half - last.angleDeg) / (first.angleDeg + span - last.angleDeg)
    moved.unshift({ angleDeg: -half, bar: last.bar + share * (first.bar - last.bar) })
  }
  return { angleDeg: moved.map((point) => point.angleDeg), pressureBar: moved.map((point) => point.bar) }
}
