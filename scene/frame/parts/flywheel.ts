import { addLathe, tubeProfile } from '../mesh/lathe'
import type { MeshBuilder } from '../mesh/mesh-builder'
import { arc, circle, rectangle, through } from '../mesh/outline'
import { addPrism } from '../mesh/prism'
import { STEEL } from '../shape'

const RIM_STEPS = 56
const ROUND_STEPS = 32
/** Thickness of a flywheel, and of its flange, to its radius (common practice). */
const THICKNESS = 0.15
const HOLES = 6

/** Radius of a steel disc of this inertia, J = π/2·ρ·t·R⁴ with t = 0.15·R; kept within the picture's bounds. */
export function flywheelRadius(inertia: number, least: number, most: number): number {
  const radius = ((2 * inertia) / (Math.PI * STEEL * THICKNESS)) ** 0.2
  return Math.min(Math.max(inertia > 0 ? radius : 0, least), most)
}

export interface FlywheelSize {
  radius: number
  journal: number
  /** Where the journal ends, and from where on nothing stands in the disc's way. */
  from: number
  clear: number
}

/** Flange, disc with lightening holes and a timing notch at the top at 0°, and bolts: its turning can be seen. */
export function addFlywheel(builder: MeshBuilder, { radius, journal, from, clear }: FlywheelSize): number {
  const thickness = THICKNESS * radius
  const flange = Math.max(from + 0.35 * journal, clear)
  const back = flange + thickness
  const bolts = Math.max(0.86 * journal, 0.2 * radius)
  const hub = bolts + 0.3 * journal
  addLathe(builder, { profile: tubeProfile(0, hub, from, flange), axis: 'z', steps: ROUND_STEPS })
  const notch = 0.05
  const up = Math.PI / 2
  const rim = [
    ...arc(0, 0, radius, up + notch, up + 2 * Math.PI - notch, RIM_STEPS),
    ...arc(0, 0, 0.94 * radius, up - notch, up + notch, RIM_STEPS),
  ]
  const middle = (hub + radius) / 2
  const hole = Math.min(0.27 * (radius - hub), 0.34 * middle)
  const around = (radiusAt: number, shift: number) =>
    Array.from({ length: HOLES }, (_, i) => {
      const angle = up + (2 * Math.PI * (i + shift)) / HOLES
      return [radiusAt * Math.cos(angle), radiusAt * Math.sin(angle)] as const
    })
  const holes = hole > 0.04 * radius ? around(middle, 0.5).map(([x, y]) => circle(x, y, hole, 20)) : []
  addPrism(builder, { outline: rim, holes, from: flange, to: back })
  const bolt = 0.13 * journal
  for (const at of around(bolts, 0)) {
    addLathe(builder, {
      profile: tubeProfile(0, bolt, back, back + 0.7 * bolt),
      axis: 'z',
      at: [...at],
      steps: 6,
    })
  }
  return back + 0.7 * bolt
}

/** The nose at the free end, stepped, with the key that drives what sits on it. Returns where it ends. */
export function addFreeEnd(builder: MeshBuilder, journal: number, from: number): number {
  const collar = from - 0.25 * journal
  const end = collar - 1.5 * journal
  const nose = 0.62 * journal
  const edge = 0.07 * journal
  addLathe(builder, { profile: tubeProfile(0, 0.9 * journal, collar, from), axis: 'z', steps: ROUND_STEPS })
  addLathe(builder, {
    profile: through([0, end], [nose - edge, end], [nose, end + edge], [nose, collar], [0, collar]),
    axis: 'z',
    steps: ROUND_STEPS,
  })
  const half = 0.16 * journal
  addPrism(builder, {
    outline: rectangle(-half, 0.8 * nose, half, nose + half),
    from: end + 0.3 * journal,
    to: collar - 0.12 * journal,
  })
  return end
}
