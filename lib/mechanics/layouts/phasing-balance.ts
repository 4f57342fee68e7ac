import type { LayoutRequest, Turning } from './layout'
import { bankAngleOf, bankOf, pinAngle, type Space } from './space'

/** Webs stand this far to either side of their throw, in throw spacings. */
export const WEB = 0.25

/** Two webs a throw, about the middle of the crank, in throw spacings. */
export const webPlaces = (throws: number): number[] =>
  Array.from({ length: 2 * throws }, (_, web) => (web >> 1) - (throws - 1) / 2 + (web % 2 === 0 ? -WEB : WEB))

const PARTS = 16

/** Balance of one phasing; `balanceOf` fills the same object again. */
export interface PhasingBalance {
  force1: Turning
  couple1: Turning
  force2: Turning
  couple2: Turning
  /** After the least counterweights: F1 and F1·a, long half-axis. */
  firstForce: number
  firstCouple: number
  /** Long half-axis: F2 and F2·a. */
  secondForce: number
  secondCouple: number
  /** Moment of the largest of the least counterweights, m·r. */
  counterweight: number
}

/**
 * Free force and couple of order N = 1, 2 of equal reciprocating masses m in F_N (F1 = m·r·ω², F2 = r/l·F1) and F_N·a, a the
 * throw spacing, about the middle throw. Forward ½·Σ e^{i(Nφ − (N − 1)β)}, backward ½·Σ e^{i(−Nφ + (N + 1)β)}, couples with
 * z: φ pin, β bank (direct and reverse crank; common practice). Their ellipse's long half-axis is forward + backward.
 *
 * Counterweights: the least-norm weights (see counterweights) on two webs a throw that balance pins with bob-weights of
 * rotating + factor·m a rod. They take the rotating part and turn the forward part of order 1 into |1 − 2·factor| of it.
 */
export function balanceOf(
  space: Space,
  request: LayoutRequest,
): (units: ArrayLike<number>) => PhasingBalance {
  const { throws, divisions, rodsPerThrow } = space
  const table = new Float64Array(throws * divisions * PARTS)
  const middle = (throws - 1) / 2
  for (let k = 0; k < throws; k++)
    for (let unit = 0; unit < divisions; unit++)
      for (let rod = 0; rod < rodsPerThrow; rod++) {
        const at = (k * divisions + unit) * PARTS
        const pin = pinAngle(space, k, unit, rod)
        const bank = bankAngleOf(space, bankOf(space, k, rod))
        const z = k - middle + (rodsPerThrow === 2 ? (rod - 0.5) * request.rodOffset : 0)
        ;[pin, -pin + 2 * bank, 2 * pin - bank, -2 * pin + 3 * bank].forEach((angle, part) => {
          const [re, im] = [Math.cos(angle) / 2, Math.sin(angle) / 2]
          table[at + 4 * part] += re
          table[at + 4 * part + 1] += im
          table[at + 4 * part + 2] += z * re
          table[at + 4 * part + 3] += z * im
        })
      }

  const bob = 2 * (request.rotating + request.balanceFactor)
  const kept = Math.abs(1 - 2 * request.balanceFactor)
  const square = webPlaces(throws).reduce((sum, place) => sum + place * place, 0)
  const end = middle + WEB

  const sum = new Float64Array(PARTS)
  const turning = (): Turning => ({ forward: 0, backward: 0 })
  const out: PhasingBalance = {
    force1: turning(),
    couple1: turning(),
    force2: turning(),
    couple2: turning(),
    firstForce: 0,
    firstCouple: 0,
    secondForce: 0,
    secondCouple: 0,
    counterweight: 0,
  }
  const size = (part: number) => {
    const found = Math.sqrt(sum[part] * sum[part] + sum[part + 1] * sum[part + 1])
    return found < 1e-12 ? 0 : found
  }
  return (units) => {
    sum.fill(0)
    for (let k = 0; k < throws; k++) {
      const at = (k * divisions + units[k]) * PARTS
      for (let part = 0; part < PARTS; part++) sum[part] += table[at + part]
    }
    out.force1.forward = size(0)
    out.couple1.forward = size(2)
    out.force1.backward = size(4)
    out.couple1.backward = size(6)
    out.force2.forward = size(8)
    out.couple2.forward = size(10)
    out.force2.backward = size(12)
    out.couple2.backward = size(14)
    out.firstForce = kept * out.force1.forward + out.force1.backward
    out.firstCouple = kept * out.couple1.forward + out.couple1.backward
    out.secondForce = out.force2.forward + out.force2.backward
    out.secondCouple = out.couple2.forward + out.couple2.backward
    // |α ± γ·z| grows to the ends: the larger of the two end webs
    const [a, b] = [bob / (2 * throws), (bob * end) / square]
    const [re, im, cre, cim] = [a * sum[0], a * sum[1], b * sum[2], b * sum[3]]
    const largest = Math.max(Math.hypot(re + cre, im + cim), Math.hypot(re - cre, im - cim))
    out.counterweight = largest < 1e-12 ? 0 : largest
    return out
  }
}
