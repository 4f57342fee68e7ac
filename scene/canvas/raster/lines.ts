import { clipEdge } from './clip'
import { clearRuns, inkRuns, joinRun } from './runs'
import {
  depthTolerance,
  farInk,
  farInsideHalf,
  farOutlineHalf,
  fleckLength,
  gapLength,
  ghostHalf,
  ghostInk,
  insideHalf,
  outlineHalf,
  thinnestOutline,
} from '@/scene/frame/manner'
import { CROSSING, depthRange } from './view'
import type { Raster } from './types'

/**
 * Inks the edges of every part drawn: a crease where either face looks at us, a smooth edge where one does and the
 * other does not. Numbers, never doubles, go into the walk, so that nothing is boxed.
 */
export function inkLines(raster: Raster) {
  const { view } = raster
  clearRuns(raster.runs)
  for (let i = 0; i < view.solidCount; i++) walkPart(raster, view.solids[i], false)
  for (let i = 0; i < view.ghostCount; i++) walkPart(raster, view.ghosts[i], true)
  inkRuns(raster)
}

function walkPart(raster: Raster, part: number, ghost: boolean) {
  const { flat } = raster
  const mesh = flat.partMesh[part]
  for (let edge = flat.meshCrease[mesh]; edge < flat.meshCrease[mesh + 1]; edge++)
    considerEdge(raster, part, flat.creases, edge * 4, true, ghost)
  for (let edge = flat.meshSmooth[mesh]; edge < flat.meshSmooth[mesh + 1]; edge++)
    considerEdge(raster, part, flat.smooth, edge * 4, false, ghost)
}

function considerEdge(
  raster: Raster,
  part: number,
  edges: Int32Array,
  at: number,
  crease: boolean,
  ghost: boolean,
) {
  const { flat, view } = raster
  const firstFace = flat.partFace[part]
  const faceA = edges[at + 2]
  const faceB = edges[at + 3]
  const seenA = faceA >= 0 && view.facing[firstFace + faceA] !== 0
  const seenB = faceB >= 0 && view.facing[firstFace + faceB] !== 0
  if (crease ? !seenA && !seenB : seenA === seenB) return
  // Two faces towards us are never an outline.
  if (ghost && seenA && seenB) return
  const mesh = flat.partMesh[part]
  const face = flat.meshFace[mesh] + (seenA ? faceA : faceB)
  const firstSurface = flat.partSurface[part]
  const surface = firstSurface + flat.faceSurface[face]
  const other = seenA && seenB ? firstSurface + flat.faceSurface[flat.meshFace[mesh] + faceB] : surface
  const a = edges[at]
  const b = edges[at + 1]
  const firstVertex = flat.partVertex[part]
  let third = -1
  if (seenA !== seenB) {
    const { triangles } = flat
    third = firstVertex + triangles[face * 3] + triangles[face * 3 + 1] + triangles[face * 3 + 2] - a - b
  }
  if (view.state[part] === CROSSING) {
    if (clipEdge(raster, part, a, b))
      walkEdge(raster, part, flat.vertexCount, flat.vertexCount + 1, surface, other, -1, ghost)
  } else walkEdge(raster, part, firstVertex + a, firstVertex + b, surface, other, third, ghost)
}

/**
 * Walks an edge in steps of one pixel. It shows where one of three pixels across the line holds one of the edge's
 * own front surfaces at about its depth, or, where those are too narrow to be met, another surface of its part that
 * is not before it, or where its very pixel is behind it. A visible run is as much an outline as it has another body
 * beyond.
 */
function walkEdge(
  raster: Raster,
  part: number,
  a: number,
  b: number,
  surface: number,
  other: number,
  third: number,
  ghost: boolean,
) {
  if (raster.runs.count + 8 > raster.runs.parent.length) return
  const { view, flat, runs, width, height, scale } = raster
  const { x, y, z } = view
  const { surfaceBody, surfacePart } = flat
  const x0 = x[a]
  const y0 = y[a]
  const dx = x[b] - x0
  const dy = y[b] - y0
  // The piece of it that is on the picture.
  let from = 0
  let to = 1
  const right = width - 0.01
  const bottom = height - 0.01
  if (dx !== 0) {
    const enter = (dx > 0 ? -x0 : right - x0) / dx
    const leave = (dx > 0 ? right - x0 : -x0) / dx
    if (enter > from) from = enter
    if (leave < to) to = leave
  } else if (x0 < 0 || x0 > right) return
  if (dy !== 0) {
    const enter = (dy > 0 ? -y0 : bottom - y0) / dy
    const leave = (dy > 0 ? bottom - y0 : -y0) / dy
    if (enter > from) from = enter
    if (leave < to) to = leave
  } else if (y0 < 0 || y0 > bottom) return
  if (!(to > from)) return

  const longest = Math.max(Math.abs(dx), Math.abs(dy))
  const steps = Math.max(1, Math.ceil(longest * (to - from)))
  const step = (to - from) / steps
  const across = Math.abs(dx) >= Math.abs(dy) ? width : 1
  const length = Math.sqrt(dx * dx + dy * dy) || 1
  let beyondX = 0
  let beyondY = 0
  if (third >= 0) {
    // Away from the face that is seen.
    const side = dx * (y[third] - y0) - dy * (x[third] - x0) > 0 ? 1 : -1
    beyondX = (side * dy * 2 * scale) / length
    beyondY = (-side * dx * 2 * scale) / length
  }
  const pixels = ghost ? raster.ghostPixels : raster.pixels
  const solid = raster.pixels
  const surfaceMask = (1 << flat.surfaceBits) - 1
  const depthMask = -1 << (flat.surfaceBits + 1)
  const tolerance = depthTolerance * depthRange
  const dz = z[b] - z[a]
  const body = surfaceBody[surface]
  const gap = gapLength * scale + 1
  let first = -1
  let last = -1
  let outside = 0
  let samples = 0
  for (let i = 0; i <= steps + 1; i++) {
    if (first >= 0 && (i > steps || i - last > gap)) {
      const { ends } = runs
      const o = runs.count * 4
      const begin = from + first * step
      const finish = from + last * step
      ends[o] = x0 + begin * dx
      ends[o + 1] = y0 + begin * dy
      ends[o + 2] = x0 + finish * dx
      ends[o + 3] = y0 + finish * dy
      runs.outline[runs.count] = outside / samples
      closeRun(raster, part, surface, other, ghost)
      if (begin === 0 && a < flat.vertexCount) joinRun(runs, a)
      if (finish > 0.999999 && b < flat.vertexCount) joinRun(runs, b)
      first = -1
    }
    if (i > steps) return
    const t = from + i * step
    const px = x0 + t * dx
    const py = y0 + t * dy
    const depth = z[a] + t * dz
    const at = ((py | 0) + 1) * width + (px | 0)
    let shows = (pixels[at] & depthMask) < depth
    for (let k = at - across; !shows && k <= at + across; k += across) {
      const there = (pixels[k] >> 1) & surfaceMask
      const ahead = (pixels[k] & depthMask) - depth
      if (there === surface || there === other) shows = ahead < tolerance && ahead > -tolerance
      else shows = ahead < 0 && surfacePart[there] === part
    }
    if (!shows) continue
    let bodyBeyond = body
    if (third >= 0) {
      const bx = px + beyondX
      const by = py + beyondY
      if (bx >= 0 && by >= 0 && bx < width && by < height)
        bodyBeyond = surfaceBody[(pixels[((by | 0) + 1) * width + (bx | 0)] >> 1) & surfaceMask]
    }
    if (ghost && (bodyBeyond === body || (solid[at] & depthMask) > depth)) continue
    if (first < 0) {
      first = i
      outside = samples = 0
    }
    last = i
    samples++
    if (bodyBeyond !== body) outside++
  }
}

/** Gives the run whose ends were just written its weight, and counts it in. */
function closeRun(raster: Raster, part: number, surface: number, other: number, ghost: boolean) {
  const { runs, view, scale } = raster
  const run = runs.count++
  const { ends } = runs
  const o = run * 4
  const far = view.far[part]
  // Crowded lines have narrow surfaces on both sides; beside a wide one a line has room.
  const thin = Math.max(view.thin[surface], view.thin[other])
  const outline = (outlineHalf + (farOutlineHalf - outlineHalf) * far) * Math.max(thinnestOutline, thin)
  const inside = (insideHalf + (farInsideHalf - insideHalf) * far) * thin
  runs.half[run] = (ghost ? ghostHalf : inside + (outline - inside) * runs.outline[run]) * scale
  runs.strength[run] = 255 * (ghost ? ghostInk : 1 + (farInk - 1) * far)
  const dx = ends[o + 2] - ends[o]
  const dy = ends[o + 3] - ends[o + 1]
  runs.length[run] = Math.sqrt(dx * dx + dy * dy)
  runs.least[run] = (fleckLength * scale) / thin
  runs.parent[run] = run
}
