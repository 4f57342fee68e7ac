import type { ShaftChain } from './shaft-modes'

export interface HolzerTable {
  /** Angle at each inertia with 1 at the first. */
  amplitudes: number[]
  /** I·ω²·φ of each inertia, N m. */
  torques: number[]
  /** Sum of the torques, N m: 0 at a natural frequency, what would have to be put in at the end at any other. */
  residual: number
}

/**
 * Holzer’s table at ω (rad/s, 0 or more) along a free chain: φ₁ = 1, φᵢ₊₁ = φᵢ − Σ(I·ω²·φ)/kᵢ.
 * Source: S. S. Rao, Mechanical Vibrations, 5th ed., chapter 7, Holzer’s method.
 */
export function holzer({ inertias, stiffnesses }: ShaftChain, speed: number): HolzerTable {
  const amplitudes: number[] = []
  const torques: number[] = []
  let [amplitude, residual] = [1, 0]
  inertias.forEach((inertia, i) => {
    amplitudes.push(amplitude)
    const torque = inertia * speed ** 2 * amplitude
    torques.push(torque)
    residual += torque
    amplitude -= residual / stiffnesses[i]
  })
  return { amplitudes, torques, residual }
}
