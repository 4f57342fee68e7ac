import { symmetricModes } from '@/lib/numerics/symmetric-modes'

/** Lumped inertias (kg m²) on a shaft without mass: `stiffnesses[i]` (N m/rad) joins inertia i to i + 1. */
export interface ShaftChain {
  inertias: readonly number[]
  stiffnesses: readonly number[]
}

export interface ShaftMode {
  /** Natural frequency, rad/s. */
  frequency: number
  /** Angle at each inertia: the greatest is 1 in size, that of the first is positive. */
  shape: number[]
}

/**
 * Natural frequencies and shapes of a free chain of two or more inertias, lowest first, one fewer than inertias: the
 * rigid turn at 0 is left out. K·φ = ω²·I·φ, undamped. Within 1e-9 of the true frequency while the greatest ω² is below
 * some 1e6 times the least. Throws RangeError where a figure is not above 0 or their numbers do not fit.
 *
 * Source: S. S. Rao, Mechanical Vibrations, 5th ed., chapters 6 and 7 (eigenvalues of a chain; Holzer’s residual).
 */
export function shaftModes({ inertias, stiffnesses }: ShaftChain): ShaftMode[] {
  const count = inertias.length
  if (count < 2 || stiffnesses.length !== count - 1)
    throw new RangeError(
      `${count} inertias need ${Math.max(1, count - 1)} stiffnesses between them, not ${stiffnesses.length}.`,
    )
  if (![...inertias, ...stiffnesses].every((value) => Number.isFinite(value) && value > 0))
    throw new RangeError('Every inertia and every stiffness must be above 0.')
  const k = inertias.map(() => new Array<number>(count).fill(0))
  stiffnesses.forEach((stiffness, i) => {
    k[i][i] += stiffness
    k[i + 1][i + 1] += stiffness
    k[i][i + 1] -= stiffness
    k[i + 1][i] -= stiffness
  })
  return symmetricModes(k, inertias)
    .slice(1)
    .map(({ shape }) => ({
      frequency: rayleighFrequency({ inertias, stiffnesses }, shape),
      shape: toGreatest(shape),
    }))
}

/**
 * ω of a shape by Rayleigh’s quotient, √(Σ k·Δφ² / Σ I·φ²), rad/s. Its error is the square of the shape’s, and low
 * frequencies keep all their figures beside high ones. Source: S. S. Rao, Mechanical Vibrations, 5th ed., chapter 7.
 */
export function rayleighFrequency({ inertias, stiffnesses }: ShaftChain, shape: readonly number[]): number {
  const strain = stiffnesses.reduce((sum, k, i) => sum + k * (shape[i + 1] - shape[i]) ** 2, 0)
  const motion = inertias.reduce((sum, inertia, i) => sum + inertia * shape[i] ** 2, 0)
  return Math.sqrt(strain / motion)
}

function toGreatest(shape: readonly number[]): number[] {
  const size = Math.max(...shape.map(Math.abs))
  const scale = (shape[0] < 0 ? -1 : 1) * size
  return shape.map((value) => value / scale)
}

/** How often a shape passes through 0 along the shaft: its nodes. */
export const nodesOf = (shape: readonly number[]): number => {
  const signs = shape
    .map((value) => (Math.abs(value) < 1e-9 ? 0 : Math.sign(value)))
    .filter((sign) => sign !== 0)
  return signs.filter((sign, i) => i > 0 && sign !== signs[i - 1]).length
}
