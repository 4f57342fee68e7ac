import { bracketedRoot } from '@/lib/numerics/bracketed-root'
import { wrap } from '@/lib/numerics/wrap'
import { pistonHeight } from './link-rod'
import { buildRodMotion, fillRodMotion } from './rod-motion'
import type { RodPath } from './rod-path'
import { bottomDeadCentre, bottomHeight, topDeadCentre, topHeight } from './slider-crank'

/** Exact dead centres of one cylinder: crank angles in 0…2π, rad, and the piston pin's heights there, m. */
export interface DeadCentres {
  top: number
  bottom: number
  topHeight: number
  bottomHeight: number
}

const TURN = 2 * Math.PI

/**
 * Dead centres of every cylinder. For a rod on its own pin in closed form (crank and rod in line); for a link rod where
 * its s is greatest and least, found as the root of ds/dθ to double precision.
 */
export function deadCentres(paths: readonly RodPath[]): DeadCentres[] {
  return paths.map((path, index) => {
    if (path.master >= 0) return linkDeadCentres(paths, index)
    const { radius: r, length: l, offset: e } = path
    return {
      top: wrap(topDeadCentre(r, l, e) - path.phase, TURN),
      bottom: wrap(bottomDeadCentre(r, l, e) - path.phase, TURN),
      topHeight: topHeight(r, l, e),
      bottomHeight: bottomHeight(r, l, e),
    }
  })
}

function linkDeadCentres(paths: readonly RodPath[], index: number): DeadCentres {
  const motion = buildRodMotion(paths.length)
  const slope = (theta: number) => {
    const [cos, sin] = [Math.cos(theta), Math.sin(theta)]
    fillRodMotion(motion, paths, paths[index].master, cos, sin)
    fillRodMotion(motion, paths, index, cos, sin)
    return motion.pin1[index]
  }
  const steps = 360
  const heights = Array.from({ length: steps }, (_, step) =>
    pistonHeight(paths, index, (TURN * step) / steps),
  )
  const extreme = (height: number) => {
    const step = heights.indexOf(height)
    return bracketedRoot(slope, (TURN * (step - 1)) / steps, (TURN * (step + 1)) / steps)
  }
  const top = extreme(Math.max(...heights))
  const bottom = extreme(Math.min(...heights))
  return {
    top: wrap(top, TURN),
    bottom: wrap(bottom, TURN),
    topHeight: pistonHeight(paths, index, top),
    bottomHeight: pistonHeight(paths, index, bottom),
  }
}
