import type { MeshBuilder, SurfaceSpec } from './mesh-builder'
import { isCorner, type Outline } from './outline'
import { placed, type Axis } from './axis'
import { triangulate } from './triangulate'

export interface Prism {
  outline: Outline
  /** Through openings; like the outline counter-clockwise. */
  holes?: Outline[]
  from: number
  to: number
  /** Hollows let into both ends to this depth. */
  pockets?: { outlines: Outline[]; depth: number }
  axis?: Axis
  side?: SurfaceSpec
  ends?: SurfaceSpec
  /** Sides whose edge starts at these points of the outline lie against another part. */
  isBuried?: (point: number) => boolean
}

/** A closed solid of one outline between two planes. */
export function addPrism(builder: MeshBuilder, prism: Prism) {
  const { outline, holes = [], from, to, pockets, axis = 'z', side = {}, ends = {}, isBuried } = prism
  const put = placed(builder, axis)
  const ring = (loop: Outline, height: number) => {
    const rows: number[] = []
    for (let i = 0; i < loop.length; i += 2) rows.push(put(loop[i], loop[i + 1], height))
    return rows
  }
  const wall = (
    loop: Outline,
    low: number[],
    high: number[],
    inward: boolean,
    buried?: Prism['isBuried'],
  ) => {
    let surface = -1
    let silent = false
    const count = low.length
    const firstCorner = low.findIndex((_, i) => isCorner(loop, i, true))
    for (let k = 0; k < count; k++) {
      const i = (Math.max(firstCorner, 0) + k) % count
      const j = (i + 1) % count
      const lies = buried?.(i) ?? false
      if (surface < 0 || lies !== silent || (k > 0 && isCorner(loop, i, true))) {
        silent = lies
        surface = builder.surface(silent ? { ...side, silent } : side)
      }
      const [a, b] = inward ? [j, i] : [i, j]
      builder.triangle(low[a], low[b], high[b], surface)
      builder.triangle(low[a], high[b], high[a], surface)
    }
  }
  const cap = (loops: Outline[], rows: number[][], up: boolean) => {
    const surface = builder.surface(ends)
    const vertices = rows.flat()
    const triangles = triangulate(loops[0], loops.slice(1))
    for (let i = 0; i < triangles.length; i += 3) {
      const a = vertices[triangles[i]]
      const b = vertices[triangles[i + 1]]
      const c = vertices[triangles[i + 2]]
      if (up) builder.triangle(a, b, c, surface)
      else builder.triangle(a, c, b, surface)
    }
  }
  const loops = [outline, ...holes]
  const low = loops.map((loop) => ring(loop, from))
  const high = loops.map((loop) => ring(loop, to))
  loops.forEach((loop, i) => wall(loop, low[i], high[i], i > 0, i === 0 ? isBuried : undefined))
  const hollows = pockets?.outlines ?? []
  const depth = pockets?.depth ?? 0
  for (const [rows, height, up] of [
    [low, from, false],
    [high, to, true],
  ] as const) {
    const floor = up ? height - depth : height + depth
    const rims = hollows.map((loop) => ring(loop, height))
    cap([...loops, ...hollows], [...rows, ...rims], up)
    hollows.forEach((loop, i) => {
      const sunk = ring(loop, floor)
      wall(loop, up ? sunk : rims[i], up ? rims[i] : sunk, true)
      cap([loop], [sunk], up)
    })
  }
}
