import { convert } from '@/lib/units/units'
import { most, type CrankTrain } from './crank-train'
import { say } from './say'
import { readTraceHead, type TraceHead } from './trace-head'
import { fromZero, wholeCycle, type Point } from './trace-cycle'

/** Something in a file that cannot be taken, at its row as a spreadsheet counts; 0 where it is about the whole. */
export interface TraceFault {
  row: number
  code: string
  message: string
  fix: string
}

export type ReadTrace =
  | {
      ok: true
      /** From firing top dead centre, a whole cycle from its beginning. */
      angleDeg: number[]
      /** Absolute. */
      pressureBar: number[]
      /** How the file was understood, where it does not say so itself. */
      understood: string[]
    }
  | { ok: false; faults: TraceFault[]; /** Of these the first are listed. */ total: number }

/** Faults that are listed; the rest are counted. */
export const listedFaults = 50

/** Common practice, bar: no cylinder holds more. */
const HIGHEST = 350
const ATMOSPHERE = 1.01325

/**
 * A measured trace from the cells of a file: a header that names the units, then angle and pressure a row over one whole
 * cycle, either from −half a cycle to half a cycle from firing top dead centre or from 0 on. Blank rows are passed over;
 * every other row that cannot be taken is told with its number.
 */
export function readTraceFile(
  rows: readonly string[][],
  decimalComma: boolean,
  cycle: CrankTrain['cycle'],
): ReadTrace {
  const at = rows.findIndex((row) => !isBlank(row))
  if (at < 0) return whole('trace-empty', 'The file has no rows.', 'Give angle and pressure, a row a point.')
  const read = readTraceHead(rows[at])
  if (!read.ok)
    return { ok: false, total: 1, faults: [fault(at + 1, 'trace-header', read.message, read.fix)] }
  const { points, faults } = pointsOf(rows, at + 1, read.head, decimalComma, cycle)
  if (points.length > most.tracePoints)
    faults.push(
      fault(
        0,
        'trace-too-long',
        `The file has ${say(points.length, '')} points, more than ${say(most.tracePoints, '')}.`,
        `Keep one point in ${Math.ceil(points.length / most.tracePoints)}.`,
      ),
    )
  if (faults.length > 0) return { ok: false, faults: faults.slice(0, listedFaults), total: faults.length }
  const taken = wholeCycle(points, read.head.zero, cycle)
  if (!taken.ok) return whole('trace-not-whole-cycle', taken.message, taken.fix)
  const understood = [
    ...(read.head.gauge === null
      ? ['The header does not say gauge: the pressures are taken as absolute.']
      : []),
    ...taken.understood,
  ]
  return { ok: true, angleDeg: taken.angleDeg, pressureBar: taken.pressureBar, understood }
}

const fault = (row: number, code: string, message: string, fix: string): TraceFault => ({
  row,
  code,
  message,
  fix,
})
const whole = (code: string, message: string, fix: string): ReadTrace => ({
  ok: false,
  total: 1,
  faults: [fault(0, code, message, fix)],
})
const isBlank = (row: readonly string[]) => row.every((cell) => cell === '')

function pointsOf(
  rows: readonly string[][],
  first: number,
  head: TraceHead,
  decimalComma: boolean,
  cycle: CrankTrain['cycle'],
) {
  const span = cycle === 'four-stroke' ? 720 : 360
  const points: Point[] = []
  const faults: TraceFault[] = []
  for (let i = first; i < rows.length; i++) {
    if (isBlank(rows[i])) continue
    const row = i + 1
    const refuse = (code: string, words: string, fix: string) =>
      faults.push(fault(row, code, `Row ${row}: ${words}`, fix))
    const angle = numberIn(rows[i][head.angle], decimalComma)
    const pressure = numberIn(rows[i][head.pressure], decimalComma)
    const lacking = [angle === '' ? 'angle' : null, pressure === '' ? 'pressure' : null].filter(Boolean)
    if (lacking.length > 0) {
      refuse('missing-cell', `no ${lacking.join(' and no ')}.`, 'Give both, or take the row out.')
      continue
    }
    const unread = [rows[i][head.angle], rows[i][head.pressure]][typeof angle === 'number' ? 1 : 0]
    if (typeof angle !== 'number' || typeof pressure !== 'number') {
      refuse(
        'not-a-number',
        `“${unread.slice(0, 40)}” is not a number.`,
        decimalComma ? 'Write such as 12,5 or 12.5.' : 'Write such as 12.5.',
      )
      continue
    }
    const angleDeg = convert(angle, head.angleUnit, '°')
    const bar = convert(pressure, head.pressureUnit, 'bar') + (head.gauge ? ATMOSPHERE : 0)
    const zeroFirst = fromZero(points.length > 0 ? points[0].angleDeg : angleDeg)
    const [least, greatest] = zeroFirst ? [0, span] : [-span / 2, span / 2]
    const range = `${say(least, '')} to ${say(greatest, '')}`
    const last = points.at(-1)
    if (angleDeg < least - END || angleDeg > greatest + END)
      refuse(
        'angle-out-of-range',
        `angle ${inDegrees(angleDeg)} is outside ${range}, one ${cycle} cycle.`,
        'Give one cycle.',
      )
    else if (last && angleDeg <= last.angleDeg)
      refuse(
        angleDeg < last.angleDeg ? 'angle-goes-back' : 'angle-repeats',
        angleDeg < last.angleDeg
          ? `angle goes back from ${inDegrees(last.angleDeg)} to ${inDegrees(angleDeg)}. Rows must rise from ${range}.`
          : `angle ${inDegrees(angleDeg)} stands twice. Rows must rise from ${range}.`,
        'Sort the rows by angle and keep one at each.',
      )
    else if (bar < 0 || bar > HIGHEST)
      refuse(
        'pressure-out-of-range',
        bar < 0
          ? `pressure ${say(pressure, head.pressureUnit)} is below nothing as an absolute pressure.`
          : `pressure ${say(pressure, head.pressureUnit)} is ${say(Math.round(bar), 'bar')}, more than the ${HIGHEST} bar that a cylinder may hold.`,
        bar < 0 ? 'If it is gauge, say “gauge” in the header.' : 'Check the unit in the header.',
      )
    else points.push({ angleDeg, bar })
  }
  return { points, faults }
}

/** An angle this little beyond the end of a cycle is its end, degrees. */
const END = 1e-6

const inDegrees = (angle: number) => say(Number(angle.toFixed(3)), '')

/** A number, '' for an empty cell, null for what is none. */
function numberIn(cell: string | undefined, decimalComma: boolean): number | '' | null {
  if (cell === undefined || cell === '') return ''
  const plain = cell.replace('\u2212', '-')
  const text = decimalComma ? plain.replace(',', '.') : plain
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(text) && Number.isFinite(Number(text))
    ? Number(text)
    : null
}
