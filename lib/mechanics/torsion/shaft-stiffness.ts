/** Shear modulus of steel, Pa (common practice). */
export const STEEL_SHEAR = 79e9

/** A round length of a shaft, m; `inner` is the diameter of its bore. */
export interface RoundLength {
  length: number
  outer: number
  inner?: number
}

/** J = π(D⁴ − d⁴)/32, m⁴. */
export const polarMoment = (outer: number, inner = 0): number => (Math.PI / 32) * (outer ** 4 - inner ** 4)

/** Length ÷ polar moment, 1/m³: those of lengths in series add up, and a stiffness is G ÷ their sum. */
export const twist = ({ length, outer, inner }: RoundLength): number => length / polarMoment(outer, inner)

/** k = G ÷ Σ(L/J), N m/rad, of round lengths in series; G shear modulus, Pa. Lengths and diameters above 0. */
export const shaftStiffness = (lengths: readonly RoundLength[], shear: number): number =>
  shear / lengths.reduce((sum, one) => sum + twist(one), 0)

/**
 * Length of a shaft of one diameter as stiff as these lengths in series, m: J·Σ(L/J).
 * Source: T. Bevan, The Theory of Machines, chapter 15, torsionally equivalent shaft.
 */
export const equivalentLength = (lengths: readonly RoundLength[], outer: number): number =>
  polarMoment(outer) * lengths.reduce((sum, one) => sum + twist(one), 0)
