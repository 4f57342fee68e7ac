import type { Complex } from '@/lib/numerics/fourier'

/** A rotating unbalance at a place along the crank: vertical + i·horizontal at θ = 0. */
export interface Unbalance {
  place: number
  moment: Complex
}

/**
 * Counterweight moments at the webs `places` that balance all of `unbalances` in force and couple, with the least sum of
 * squares: U_j = −(α + γ·(z_j − z̄)), α = ΣU/n and γ = Σ(z − z̄)·U/Σ(z_j − z̄)². At least two places, not all one.
 * Source: least-norm solution of two linear equations (common practice).
 */
export function leastCounterweights(unbalances: readonly Unbalance[], places: readonly number[]): Complex[] {
  const middle = places.reduce((sum, place) => sum + place, 0) / places.length
  const square = places.reduce((sum, place) => sum + (place - middle) ** 2, 0)
  const total = (arm: (place: number) => number): Complex => ({
    re: unbalances.reduce((sum, { place, moment }) => sum + arm(place) * moment.re, 0),
    im: unbalances.reduce((sum, { place, moment }) => sum + arm(place) * moment.im, 0),
  })
  const force = total(() => 1 / places.length)
  const couple = total((place) => (place - middle) / square)
  return places.map((place) => ({
    re: -(force.re + couple.re * (place - middle)),
    im: -(force.im + couple.im * (place - middle)),
  }))
}
