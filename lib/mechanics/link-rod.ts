import type { RodPath } from './rod-path'
import { pistonPosition, rodAngle } from './slider-crank'

/**
 * A link rod on a master rod. The knuckle stands off the crank pin by the knuckle radius ρ, at the knuckle angle κ from
 * the master rod's own axis; that axis leans by −ψ (the master's rod angle) from the master's cylinder. So in the link's
 * own cylinder frame the knuckle is at r·e^(i(θ+phase)) + ρ·e^(i(β(master) − β + κ − ψ)).
 * Paths are those of `rodPaths`; θ is the crank angle, rad.
 */

/** The rod angle ψ of any cylinder's rod at crank angle θ. */
export function rodAngleAt(paths: readonly RodPath[], index: number, theta: number): number {
  const path = paths[index]
  const { radius, length, offset } = path
  if (path.master < 0) return rodAngle(theta + path.phase, radius, length, offset)
  return Math.asin(knuckleSide(path, theta, rodAngleAt(paths, path.master, theta)) / length)
}

/** Height s of any cylinder's piston pin at crank angle θ, m. */
export function pistonHeight(paths: readonly RodPath[], index: number, theta: number): number {
  const path = paths[index]
  const { radius, length, offset } = path
  if (path.master < 0) return pistonPosition(theta + path.phase, radius, length, offset)
  const lean = rodAngleAt(paths, path.master, theta)
  const side = knuckleSide(path, theta, lean)
  const foot = radius * Math.cos(theta + path.phase) + path.knuckleRadius * Math.cos(path.knucklePhase - lean)
  return foot + Math.sqrt(length * length - side * side)
}

/** How far the knuckle stands beside the link's cylinder axis, m. */
const knuckleSide = (path: RodPath, theta: number, lean: number) =>
  path.radius * Math.sin(theta + path.phase) +
  path.knuckleRadius * Math.sin(path.knucklePhase - lean) -
  path.offset

/**
 * The greatest |sin ψ| that a link rod would need over a whole turn: it turns only if this stays below 1.
 * Sampled twice a degree and sharpened by the parabola through the three highest, so good to about 1e-8.
 */
export function linkReach(paths: readonly RodPath[], index: number): number {
  const path = paths[index]
  const steps = 720
  const need = (step: number) => {
    const theta = (2 * Math.PI * step) / steps
    return Math.abs(knuckleSide(path, theta, rodAngleAt(paths, path.master, theta))) / path.length
  }
  let greatest = 0
  for (let step = 0; step < steps; step++) {
    const [before, here, after] = [need(step - 1), need(step), need(step + 1)]
    const bend = before - 2 * here + after
    const peak =
      here >= before && here >= after && bend < 0 ? here - (after - before) ** 2 / (8 * bend) : here
    greatest = Math.max(greatest, peak)
  }
  return greatest
}
