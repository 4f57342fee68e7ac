import type { UnitName } from '@/lib/units/units'

/** What the header of a measured trace says. */
export interface TraceHead {
  /** Columns, by their place. */
  angle: number
  pressure: number
  angleUnit: UnitName
  pressureUnit: UnitName
  /** Null where it is not said. */
  gauge: boolean | null
  /** Which top dead centre the angle 0 is, null where it is not said. */
  zero: 'firing' | 'gas-exchange' | null
}

export type ReadHead = { ok: true; head: TraceHead } | { ok: false; message: string; fix: string }

const angleUnits: Record<string, UnitName> = {
  '°': '°',
  deg: '°',
  degs: '°',
  degree: '°',
  degrees: '°',
  rad: 'rad',
  rads: 'rad',
  radian: 'rad',
  radians: 'rad',
}
const pressureUnits: Record<string, UnitName> = {
  bar: 'bar',
  bara: 'bar',
  barg: 'bar',
  kpa: 'kPa',
  mpa: 'MPa',
  psi: 'psi',
  psia: 'psi',
  psig: 'psi',
}
const gaugeWords = ['gauge', 'gage', 'g', 'barg', 'psig']
const absoluteWords = ['absolute', 'abs', 'a', 'bara', 'psia']
const firingWords = ['firing', 'combustion', 'compression', 'power']
const exchangeWords = ['exchange', 'overlap', 'intake']

const example = 'Write a header such as “crank angle deg, pressure bar absolute”.'

/** Finds the two columns of a trace by the units that their headers name. */
export function readTraceHead(cells: readonly string[]): ReadHead {
  const words = cells.map(wordsOf)
  const unitIn = (units: Record<string, UnitName>) => (own: string[]) => own.find((word) => word in units)
  const angle = words.findIndex((own) => unitIn(angleUnits)(own) !== undefined)
  const pressure = words.findIndex((own) => unitIn(pressureUnits)(own) !== undefined)
  const seen = cells.join(' | ').slice(0, 80)
  if (angle < 0)
    return {
      ok: false,
      message: `The header “${seen}” names no unit of angle: deg or rad.`,
      fix: example,
    }
  if (pressure < 0)
    return {
      ok: false,
      message: `The header “${seen}” names no unit of pressure: bar, kPa, MPa or psi.`,
      fix: example,
    }
  const says = (own: string[], list: string[]) => own.some((word) => list.includes(word))
  return {
    ok: true,
    head: {
      angle,
      pressure,
      angleUnit: angleUnits[unitIn(angleUnits)(words[angle])!],
      pressureUnit: pressureUnits[unitIn(pressureUnits)(words[pressure])!],
      gauge: says(words[pressure], gaugeWords) ? true : says(words[pressure], absoluteWords) ? false : null,
      zero: says(words[angle], exchangeWords)
        ? 'gas-exchange'
        : says(words[angle], firingWords)
          ? 'firing'
          : null,
    },
  }
}

/** Words and the degree sign, each apart: "Crank angle [°CA]" is crank, angle, °, ca. */
const wordsOf = (cell: string): string[] => cell.toLowerCase().match(/°|[a-z]+/g) ?? []
