import { EigenvalueDecomposition, Matrix } from 'ml-matrix'

/** One solution of K·φ = λ·M·φ. */
export interface SymmetricMode {
  value: number
  /** φ, one number a mass; its scale is of no account. */
  shape: number[]
}

/**
 * Modes of a symmetric K (by its rows) over masses M, the diagonal of M, all above 0: eigenvalues of M^-½·K·M^-½, least
 * first, and shapes φ = M^-½·vector (Householder and QL, by ml-matrix). An eigenvalue is good to about 1e-15 of the greatest.
 */
export function symmetricModes(
  k: readonly (readonly number[])[],
  masses: readonly number[],
): SymmetricMode[] {
  const root = masses.map(Math.sqrt)
  const scaled = k.map((row, i) => row.map((value, j) => value / (root[i] * root[j])))
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(new Matrix(scaled), {
    assumeSymmetric: true,
  })
  return realEigenvalues
    .map((value, column) => ({
      value,
      shape: eigenvectorMatrix.getColumn(column).map((part, i) => part / root[i]),
    }))
    .sort((a, b) => a.value - b.value)
}
