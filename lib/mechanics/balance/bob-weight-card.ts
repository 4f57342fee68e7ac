import { bobWeights, massSplit } from '../balance'
import type { Cylinder, Train } from '../train'

/** A cylinder's piston by its parts, kg: the train knows only their sum. */
export interface PistonParts {
  piston: number
  pin: number
  rings: number
  locks: number
}

export const cardParts = ['piston', 'pin', 'locks', 'rings', 'small end', 'big end', 'shells', 'oil'] as const
export type CardPart = (typeof cardParts)[number]

/** One line of the card; parts of one throw that weigh the same share a line. */
export interface CardRow {
  part: CardPart
  moves: 'reciprocating' | 'rotating'
  quantity: number
  each: number
  total: number
  cylinders: string[]
}

/** The bob-weight card of one throw, kg. */
export interface BobWeightCard {
  throw: string
  rows: CardRow[]
  reciprocating: number
  /** Without the oil. */
  rotating: number
  oil: number
  /** rotating + oil + factor × reciprocating. */
  total: number
  factor: BalanceFactor
}

/**
 * The two ways a balance factor is quoted: as the share of all the reciprocating mass on a pin, and of one cylinder's.
 * With k equal cylinders on the pin, of one = k × of all. Null where nothing reciprocates on the pin.
 */
export interface BalanceFactor {
  ofAll: number
  ofOne: number | null
}

export const factorOfOne = (ofAll: number, cylinders: number): number => ofAll * cylinders
export const factorOfAll = (ofOne: number, cylinders: number): number => ofOne / cylinders

/** Masses nearer than this are one weight on the scales, kg (a hundredth of a milligram). */
const SAME = 1e-8

/**
 * What hangs on each throw on the balancing machine, line by line: piston, pin, locks, rings and the rod's small end
 * reciprocate, its big end, shells and oil turn; total = rotating + oil + factor × reciprocating (common practice of the
 * balancing trade). `parts`: one entry a cylinder of the train, in its order.
 */
export function bobWeightCards(train: Train, parts: readonly PistonParts[]): BobWeightCard[] {
  return bobWeights(train).map((weight, index) => {
    const on = train.cylinders.flatMap((cylinder, i) =>
      cylinder.throw === index ? [{ cylinder, parts: parts[i] }] : [],
    )
    return {
      throw: train.throws[index].id,
      rows: cardParts.flatMap((part) => rowsOf(part, on)),
      reciprocating: weight.reciprocating,
      rotating: weight.rotating,
      oil: weight.oil,
      total: weight.mass,
      factor: {
        ofAll: train.balanceFactor,
        ofOne: on.length === 0 ? null : factorOfOne(train.balanceFactor, on.length),
      },
    }
  })
}

interface OnThrow {
  cylinder: Cylinder
  parts: PistonParts
}

function rowsOf(part: CardPart, on: readonly OnThrow[]): CardRow[] {
  const rows: CardRow[] = []
  for (const { cylinder, parts } of on) {
    const each = massOf(part, cylinder, parts)
    const row = rows.find((other) => Math.abs(other.each - each) < SAME)
    if (row) {
      row.quantity++
      row.total += each
      row.cylinders.push(cylinder.id)
    } else rows.push({ part, moves: movesOf(part), quantity: 1, each, total: each, cylinders: [cylinder.id] })
  }
  return rows
}

const movesOf = (part: CardPart): CardRow['moves'] =>
  part === 'big end' || part === 'shells' || part === 'oil' ? 'rotating' : 'reciprocating'

function massOf(part: CardPart, cylinder: Cylinder, parts: PistonParts): number {
  const small = massSplit({ ...cylinder, pistonMass: 0 }).reciprocating
  switch (part) {
    case 'small end':
      return small
    case 'big end':
      return cylinder.rod.mass - small
    case 'shells':
      return cylinder.bigEndBearing
    case 'oil':
      return cylinder.oilAllowance
    default:
      return parts[part]
  }
}
