import type { RodPath } from './rod-path'

/**
 * The motion of every rod at one crank angle, each in its cylinder's own frame (u up the cylinder, v to +90°).
 * Derivatives are with respect to the crank angle: …1 per rad, …2 per rad². m and rad.
 */
export interface RodMotion {
  /** Centre of the big end. */
  bigEndU: Float64Array
  bigEndV: Float64Array
  bigEndU1: Float64Array
  bigEndV1: Float64Array
  bigEndU2: Float64Array
  bigEndV2: Float64Array
  /** The knuckle's arm from the crank pin to a link rod's big end; 0 for a rod on its own pin. */
  armU: Float64Array
  armV: Float64Array
  /** Of the rod angle ψ: the big end stands at −l·(cos ψ, −sin ψ) from the piston pin. */
  sin: Float64Array
  cos: Float64Array
  angle1: Float64Array
  angle2: Float64Array
  /** Height s of the piston pin. */
  pin: Float64Array
  pin1: Float64Array
  pin2: Float64Array
}

export function buildRodMotion(cylinders: number): RodMotion {
  const array = () => new Float64Array(cylinders)
  return {
    bigEndU: array(),
    bigEndV: array(),
    bigEndU1: array(),
    bigEndV1: array(),
    bigEndU2: array(),
    bigEndV2: array(),
    armU: array(),
    armV: array(),
    sin: array(),
    cos: array(),
    angle1: array(),
    angle2: array(),
    pin: array(),
    pin1: array(),
    pin2: array(),
  }
}

/** Cylinders in an order in which every master comes before its links. */
export function mastersFirst(paths: readonly RodPath[]): Int32Array {
  const indices = paths.map((_, index) => index)
  return Int32Array.from([
    ...indices.filter((index) => paths[index].master < 0),
    ...indices.filter((index) => paths[index].master >= 0),
  ])
}

/**
 * Fills rod `i` for the crank angle whose cosine and sine are given; a link's master must have been filled for it.
 *
 * Big end on its crank circle (and knuckle); then sin ψ = (v − e)/l, and from v = e + l sin ψ and s = u + l cos ψ, by
 * differentiating twice: ψ₁ = v₁/(l cos ψ), ψ₂ = (v₂ + l sin ψ ψ₁²)/(l cos ψ), s₁ = u₁ − l sin ψ ψ₁,
 * s₂ = u₂ − l (cos ψ ψ₁² + sin ψ ψ₂).
 */
export function fillRodMotion(
  out: RodMotion,
  paths: readonly RodPath[],
  i: number,
  cosTheta: number,
  sinTheta: number,
): void {
  const path = paths[i]
  const { radius, length } = path
  const swingU = radius * (cosTheta * path.cosPhase - sinTheta * path.sinPhase)
  const swingV = radius * (sinTheta * path.cosPhase + cosTheta * path.sinPhase)
  let u = swingU
  let v = swingV
  let u1 = -swingV
  let v1 = swingU
  let u2 = -swingU
  let v2 = -swingV
  if (path.master >= 0) {
    const m = path.master
    const reach = path.knuckleRadius
    const armU = reach * (path.cosKnuckle * out.cos[m] + path.sinKnuckle * out.sin[m])
    const armV = reach * (path.sinKnuckle * out.cos[m] - path.cosKnuckle * out.sin[m])
    const turn1 = -out.angle1[m]
    const turn2 = -out.angle2[m]
    u += armU
    v += armV
    u1 -= armV * turn1
    v1 += armU * turn1
    out.armU[i] = armU
    out.armV[i] = armV
    u2 -= armU * turn1 * turn1 + armV * turn2
    v2 += armU * turn2 - armV * turn1 * turn1
  }
  const sin = (v - path.offset) / length
  const cos = Math.sqrt(1 - sin * sin)
  const angle1 = v1 / (length * cos)
  const angle2 = (v2 + length * sin * angle1 * angle1) / (length * cos)
  out.bigEndU[i] = u
  out.bigEndV[i] = v
  out.bigEndU1[i] = u1
  out.bigEndV1[i] = v1
  out.bigEndU2[i] = u2
  out.bigEndV2[i] = v2
  out.sin[i] = sin
  out.cos[i] = cos
  out.angle1[i] = angle1
  out.angle2[i] = angle2
  out.pin[i] = u + length * cos
  out.pin1[i] = u1 - length * sin * angle1
  out.pin2[i] = u2 - length * (cos * angle1 * angle1 + sin * angle2)
}
