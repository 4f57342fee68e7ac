import type { Complex } from '@/lib/numerics/fourier'
import type { Phasor } from '../balance'
import type { Train } from '../train'
import { complex, minus, scaled } from './phasor'

/**
 * A force F and a couple C about z = 0 as two forces at a and b (a ≠ b): F_b = (C − a·F)/(b − a), F_a = F − F_b
 * (statics). With the residual unbalance of a crank this is what a balancing machine shows in its two planes.
 * Throws RangeError where a = b.
 */
export function inTwoPlanes(force: Complex, couple: Complex, a: number, b: number): [Complex, Complex] {
  if (a === b) throw new RangeError('Two planes at one place cannot show a couple.')
  const atB = scaled(minus(couple, scaled(force, a)), 1 / (b - a))
  return [minus(force, atB), atB]
}

export const residualInPlanes = (
  residual: { static: Phasor; couple: Phasor },
  a: number,
  b: number,
): [Complex, Complex] => inTwoPlanes(complex(residual.static), complex(residual.couple), a, b)

/** A plane's share of the permissible unbalance stays within these (ISO 21940-11, from memory). */
const LEAST = 0.3
const MOST = 0.7

/**
 * How the permissible unbalance of a shaft is split between tolerance planes at a and b by the distances of its centre of
 * gravity from them: (b − c)/(b − a) and (c − a)/(b − a). Halves where c lies half-way. Source: ISO 21940-11:2016.
 */
export function toleranceShares(a: number, b: number, centre: number): [number, number] {
  const share = Math.min(MOST, Math.max(LEAST, (b - centre) / (b - a)))
  return [share, 1 - share]
}

/** Balance quality grades G, mm/s: each 2.5 times the last (ISO 21940-11:2016, table of grades). */
export const balanceGrades = [0.4, 1, 2.5, 6.3, 16, 40, 100, 250, 630, 1600, 4000] as const

/** Guidance grades of crank drives, mm/s (ISO 21940-11:2016, table of guidance grades). */
export const crankDriveGrades = {
  'inherently balanced, rigidly mounted': 16,
  'inherently balanced, elastically mounted': 40,
  'complete engines of cars, trucks and locomotives': 100,
  'inherently unbalanced, rigidly mounted': 250,
  'inherently unbalanced, elastically mounted': 630,
  'large slow marine diesel, inherently balanced': 1600,
  'large slow marine diesel, inherently unbalanced': 4000,
} as const

/** Where a balancing machine would carry the crank: the outermost mains; with fewer than two, the outermost throws; m. */
export function bearingPlanes({ mains, throws }: Train): [number, number] | null {
  const places = (mains.length >= 2 ? mains : throws).map(({ axial }) => axial)
  const [a, b] = [Math.min(...places), Math.max(...places)]
  return a < b ? [a, b] : null
}
