import type { Rig } from './types'

/**
 * The path that the tip of the shaking force draws over a cycle: world points, 3 a sample, into `out`. `forces` holds
 * vertical and horizontal in turn, N; it stands where the shaking arrow does.
 */
export function fillOrbitPath(
  out: Float64Array,
  rig: Rig,
  forces: Float64Array,
  axial: number,
  metresPerNewton: number,
): Float64Array {
  for (let i = 0; 2 * i + 1 < forces.length; i++) {
    out[3 * i] = rig.mirror * forces[2 * i + 1] * metresPerNewton
    out[3 * i + 1] = forces[2 * i] * metresPerNewton
    out[3 * i + 2] = axial
  }
  return out
}

export const buildOrbitPath = (forces: Float64Array): Float64Array =>
  new Float64Array((forces.length / 2) * 3)
