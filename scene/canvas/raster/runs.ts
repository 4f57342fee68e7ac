import type { FlatRig } from './prepare'
import type { Raster, Runs } from './types'

export function createRuns(flat: FlatRig): Runs {
  const most = 2 * flat.edgeCount + 64
  return {
    count: 0,
    ends: new Float64Array(most * 4),
    outline: new Float64Array(most),
    half: new Float64Array(most),
    strength: new Uint8Array(most),
    length: new Float64Array(most),
    least: new Float64Array(most),
    atVertex: new Int32Array(flat.vertexCount + 2),
    parent: new Int32Array(most),
  }
}

export function clearRuns(runs: Runs) {
  runs.count = 0
  runs.atVertex.fill(-1)
}

/** Ties the last run to those that end on the same vertex. */
export function joinRun(runs: Runs, vertex: number) {
  const run = runs.count - 1
  const other = runs.atVertex[vertex]
  if (other < 0) {
    runs.atVertex[vertex] = run
    return
  }
  const a = root(runs, other)
  const b = root(runs, run)
  if (a === b) return
  runs.parent[b] = a
  runs.length[a] += runs.length[b]
}

function root({ parent }: Runs, run: number) {
  while (parent[run] !== run) {
    parent[run] = parent[parent[run]]
    run = parent[run]
  }
  return run
}

/** Inks every run that is not a fleck standing alone. */
export function inkRuns(raster: Raster) {
  const { runs } = raster
  for (let run = 0; run < runs.count; run++)
    if (runs.length[root(runs, run)] >= runs.least[run]) inkRun(raster, run)
}

/**
 * A run is a capsule: ink falls off over one pixel by the distance to the segment. Where inked pieces meet the
 * darker wins, so that joints leave no dots. Thinner than a pixel, it is paler instead.
 */
function inkRun({ runs, ink, width, height }: Raster, run: number) {
  const { ends } = runs
  const o = run * 4
  const steep = Math.abs(ends[o + 3] - ends[o + 1]) > Math.abs(ends[o + 2] - ends[o])
  const backward = steep ? ends[o + 3] < ends[o + 1] : ends[o + 2] < ends[o]
  const first = backward ? o + 2 : o
  const last = backward ? o : o + 2
  const x0 = ends[first]
  const y0 = ends[first + 1]
  const x1 = ends[last]
  const y1 = ends[last + 1]
  const dx = x1 - x0
  const dy = y1 - y0
  const squared = dx * dx + dy * dy
  const inverse = squared > 0 ? 1 / squared : 0
  const half = Math.max(0.5, runs.half[run])
  const full = runs.strength[run] * Math.min(1, 2 * runs.half[run])
  const reach = half + 0.5
  const slope = squared > 0 ? (steep ? dx / dy : dy / dx) : 0
  const spread = reach * Math.sqrt(1 + slope * slope)
  const along0 = steep ? y0 : x0
  const along1 = steep ? y1 : x1
  const across0 = steep ? x0 : y0
  const across1 = steep ? x1 : y1
  const alongEnd = Math.min((steep ? height : width) - 1, Math.floor(along1 + reach))
  const acrossSize = (steep ? width : height) - 1
  for (let along = Math.max(0, Math.floor(along0 - reach)); along <= alongEnd; along++) {
    let centre = across0 + (along + 0.5 - along0) * slope
    // Beyond the ends the cap is round the end itself.
    if (along + 0.5 < along0) centre = across0
    else if (along + 0.5 > along1) centre = across1
    const from = Math.max(0, Math.floor(centre - spread))
    const to = Math.min(acrossSize, Math.floor(centre + spread))
    for (let across = from; across <= to; across++) {
      const px = (steep ? across : along) + 0.5 - x0
      const py = (steep ? along : across) + 0.5 - y0
      const t = px * dx + py * dy
      let distance: number
      if (t <= 0) distance = Math.sqrt(px * px + py * py)
      else if (t >= squared) distance = Math.sqrt((px - dx) * (px - dx) + (py - dy) * (py - dy))
      else distance = Math.abs(px * dy - py * dx) * Math.sqrt(inverse)
      if (distance >= reach) continue
      const value = reach - distance >= 1 ? full : full * (reach - distance)
      const at = steep ? (along + 1) * width + across : (across + 1) * width + along
      if (value > ink[at]) ink[at] = value
    }
  }
}
