import type { Complex } from '@/lib/numerics/fourier'
import { minus, nothing, scaled } from './phasor'

/** Where a weight sits: its place along the crank and the radius of its centre of gravity, m. */
export interface Lever {
  place: number
  radius: number
}

/** Below this the places are one place. */
const ONE_PLACE = 1e-12

/**
 * [μ₀, μ₁] of the weights m_i = r_i·(μ₀ + μ₁·z_i) that answer a force Σ r_i·m_i and a couple Σ z_i·r_i·m_i with the least
 * Σ|m_i|²: two normal equations. Where all levers stand at one place the couple is left out.
 */
export function leastSquares(levers: readonly Lever[], force: Complex, couple: Complex): [Complex, Complex] {
  const sum = (power: number) =>
    levers.reduce((total, { radius, place }) => total + radius * radius * place ** power, 0)
  const [s0, s1, s2] = [sum(0), sum(1), sum(2)]
  const det = s0 * s2 - s1 * s1
  if (det <= ONE_PLACE * s0 * s2) return [scaled(force, 1 / s0), nothing]
  const of = (a: Complex, ka: number, b: Complex, kb: number) =>
    scaled(minus(scaled(a, ka), scaled(b, kb)), 1 / det)
  return [of(force, s2, couple, s1), of(couple, s0, force, s1)]
}
