import { Matrix, solve } from 'ml-matrix'

/** x of A·x = b for a regular square A given by its rows (LU with partial pivoting, by ml-matrix). Throws where A is singular. */
export const linearSolve = (a: number[][], b: readonly number[]): number[] =>
  solve(new Matrix(a), Matrix.columnVector([...b])).to1DArray()
