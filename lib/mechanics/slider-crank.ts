/**
 * The exact slider-crank with offset. Every function takes the crank angle `alpha` from the cylinder axis (rad, any
 * value, positive in the direction of rotation), the throw radius r, the rod length l and the offset e of the
 * cylinder axis (signed, towards +90°), all in one unit of length; l > r + |e|, or the rod cannot turn.
 *
 * Crank pin at (r cos α, r sin α), piston pin at (s, e): s = r cos α + √(l² − (r sin α − e)²).
 * Velocity and acceleration are per radian and per radian squared: times ω and ω² at constant speed ω.
 * Source: the plane geometry itself; checked against published worked examples in tests/golden.
 */

/** The rod's angle ψ = asin((r sin α − e)/l): zero along the cylinder, positive where the big end is towards +90°. */
export const rodAngle = (alpha: number, r: number, l: number, e: number): number =>
  Math.asin((r * Math.sin(alpha) - e) / l)

/** Height s of the piston pin above the crank axis. */
export function pistonPosition(alpha: number, r: number, l: number, e: number): number {
  const side = r * Math.sin(alpha) - e
  return r * Math.cos(alpha) + Math.sqrt(l * l - side * side)
}

/** ds/dα = −r sin α − r cos α · tan ψ. */
export function pistonVelocity(alpha: number, r: number, l: number, e: number): number {
  const side = r * Math.sin(alpha) - e
  const reach = Math.sqrt(l * l - side * side)
  return -r * Math.sin(alpha) - (r * Math.cos(alpha) * side) / reach
}

/** d²s/dα² = −r cos α + r sin α · tan ψ − r² cos² α / (l cos³ ψ). */
export function pistonAcceleration(alpha: number, r: number, l: number, e: number): number {
  const side = r * Math.sin(alpha) - e
  const reach = Math.sqrt(l * l - side * side)
  const swing = r * Math.cos(alpha)
  return -swing + (r * Math.sin(alpha) * side) / reach - (swing * swing * l * l) / (reach * reach * reach)
}

/** α at exact top dead centre, where crank and rod are in line and stretched: asin(e/(l + r)). */
export const topDeadCentre = (r: number, l: number, e: number): number => Math.asin(e / (l + r))

/** α at exact bottom dead centre, where they are in line and folded: π + asin(e/(l − r)). */
export const bottomDeadCentre = (r: number, l: number, e: number): number => Math.PI + Math.asin(e / (l - r))

/** s at top dead centre: √((l + r)² − e²). */
export const topHeight = (r: number, l: number, e: number): number => Math.sqrt((l + r) ** 2 - e * e)

/** s at bottom dead centre: √((l − r)² − e²). */
export const bottomHeight = (r: number, l: number, e: number): number => Math.sqrt((l - r) ** 2 - e * e)
