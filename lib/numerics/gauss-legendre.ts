export interface Quadrature {
  nodes: Float64Array
  weights: Float64Array
}

/**
 * Nodes and weights of the n-point Gauss–Legendre rule on −1…1: exact for polynomials up to degree 2n − 1.
 * Roots of the Legendre polynomial by Newton's method from Tricomi's estimate (NIST Digital Library of
 * Mathematical Functions, 3.5(v) and 18.9). n ≥ 1, here up to some dozens.
 */
export function gaussLegendre(n: number): Quadrature {
  const nodes = new Float64Array(n)
  const weights = new Float64Array(n)
  for (let i = 0; i < n; i++) {
    let x = -Math.cos((Math.PI * (i + 0.75)) / (n + 0.5))
    let slope = 0
    for (let step = 0; step < 100; step++) {
      let [value, before] = [1, 0]
      for (let k = 1; k <= n; k++) [value, before] = [((2 * k - 1) * x * value - (k - 1) * before) / k, value]
      slope = (n * (x * value - before)) / (x * x - 1)
      const change = value / slope
      x -= change
      if (Math.abs(change) < 1e-15) break
    }
    nodes[i] = x
    weights[i] = 2 / ((1 - x * x) * slope * slope)
  }
  return { nodes, weights }
}
