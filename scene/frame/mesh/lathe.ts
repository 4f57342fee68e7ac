import { placed, type Axis } from './axis'
import type { MeshBuilder, SurfaceSpec } from './mesh-builder'
import { isCorner, through, TURN_STEPS, type Outline } from './outline'
import { triangulate } from './triangulate'

export interface Lathe {
  /**
   * Half the section as flat radius, height pairs, counter-clockwise round the metal (radius to the right, height up).
   * Points at radius 0 may only be its first and its last.
   */
  profile: Outline
  steps?: number
  /** Part of a turn in whole steps; its two ends are cut faces. Default the whole turn. */
  sector?: { first: number; count: number }
  axis?: Axis
  /** Middle of the turned part in its own plane. */
  at?: [number, number]
  /** Fill of the profile's edge that starts at this point. */
  specAt?: (point: number) => SurfaceSpec
}

/** A closed solid of revolution, or a sector of one with its cut faces. */
export function addLathe(builder: MeshBuilder, lathe: Lathe) {
  const { profile, steps = TURN_STEPS, sector, axis = 'y', at = [0, 0], specAt } = lathe
  const put = placed(builder, axis)
  const points = profile.length / 2
  const whole = !sector
  const rows = whole ? steps : sector.count + 1
  const first = sector?.first ?? 0
  const onAxis = (i: number) => profile[2 * i] === 0
  const poles = Array.from({ length: points }, (_, i) =>
    onAxis(i) ? put(at[0], at[1], profile[2 * i + 1]) : -1,
  )
  const grid = Array.from({ length: rows }, (_, row) => {
    const angle = (2 * Math.PI * (first + row)) / steps
    const cos = Math.cos(angle)
    const sin = Math.sin(angle)
    return poles.map((pole, i) => {
      const radius = profile[2 * i]
      return pole >= 0 ? pole : put(at[0] + radius * cos, at[1] + radius * sin, profile[2 * i + 1])
    })
  })
  const closed = !onAxis(0)
  let surface = -1
  let fill: SurfaceSpec['fill']
  for (let i = 0; i < points - (closed ? 0 : 1); i++) {
    const spec = specAt?.(i) ?? {}
    if (surface < 0 || spec.fill !== fill || isCorner(profile, i, closed)) surface = builder.surface(spec)
    fill = spec.fill
    const j = (i + 1) % points
    for (let row = 0; row < (whole ? steps : rows - 1); row++) {
      const here = grid[row]
      const next = grid[(row + 1) % rows]
      if (!onAxis(i)) builder.triangle(here[i], next[i], onAxis(j) ? here[j] : next[j], surface)
      if (!onAxis(j)) builder.triangle(here[i], next[j], here[j], surface)
    }
  }
  if (whole) return
  const section = triangulate(profile)
  for (const [row, forward] of [
    [grid[0], true],
    [grid[rows - 1], false],
  ] as const) {
    const cut = builder.surface({ cut: true })
    for (let k = 0; k < section.length; k += 3) {
      const a = row[section[k]]
      const b = row[section[k + 1]]
      const c = row[section[k + 2]]
      if (forward) builder.triangle(a, b, c, cut)
      else builder.triangle(a, c, b, cut)
    }
  }
}

/** Profile of a tube, or of a bar where there is no bore. */
export const tubeProfile = (bore: number, radius: number, from: number, to: number): Outline =>
  through([bore, from], [radius, from], [radius, to], [bore, to])
