import { DEPTH_ORIGIN, DEPTH_SCALE } from './view'
import type { Raster, View } from './types'

// Clip coordinates of up to four corners: x·w, y·w, w, distance from the near plane.
const corner = new Float64Array(16)
const kept = new Float64Array(16)

/** Lists what is before the near plane of a face (global face number of its mesh) of a part that crosses it. */
export function clipFace(raster: Raster, part: number, face: number, code: number) {
  const { flat, view } = raster
  const first = flat.meshVertex[flat.partMesh[part]]
  for (let k = 0; k < 3; k++) toClip(raster, part, first + flat.triangles[face * 3 + k], k)
  if (corner[3] > 0 && corner[7] > 0 && corner[11] > 0) {
    const vertex = flat.partVertex[part]
    const { triangles } = flat
    listFace(
      view,
      vertex + triangles[face * 3],
      vertex + triangles[face * 3 + 1],
      vertex + triangles[face * 3 + 2],
      code,
    )
    return
  }
  let count = 0
  for (let k = 0; k < 3; k++) {
    const next = (k + 1) % 3
    const here = corner[k * 4 + 3]
    const there = corner[next * 4 + 3]
    if (here > 0) {
      for (let j = 0; j < 4; j++) kept[count * 4 + j] = corner[k * 4 + j]
      count++
    }
    if (here > 0 !== there > 0) {
      const t = here / (here - there)
      for (let j = 0; j < 4; j++)
        kept[count * 4 + j] = corner[k * 4 + j] + t * (corner[next * 4 + j] - corner[k * 4 + j])
      count++
    }
  }
  const base = view.spare
  if (count < 3 || base + count > view.x.length) return
  view.spare += count
  for (let k = 0; k < count; k++) toPicture(raster, kept, k, base + k)
  for (let k = 2; k < count; k++) listFace(view, base, base + k - 1, base + k, code)
}

function listFace(view: View, a: number, b: number, c: number, code: number) {
  const at = view.faces * 3
  view.corners[at] = a
  view.corners[at + 1] = b
  view.corners[at + 2] = c
  view.codes[view.faces++] = code
}

/**
 * Writes what is before the near plane of an edge (vertex numbers of the mesh) into the two spare vertices;
 * false when nothing is.
 */
export function clipEdge(raster: Raster, part: number, a: number, b: number) {
  const first = raster.flat.meshVertex[raster.flat.partMesh[part]]
  toClip(raster, part, first + a, 0)
  toClip(raster, part, first + b, 1)
  const here = corner[3]
  const there = corner[7]
  if (here <= 0 && there <= 0) return false
  if (here <= 0 || there <= 0) {
    const t = here / (here - there)
    const out = here <= 0 ? 0 : 4
    for (let j = 0; j < 4; j++) kept[j] = corner[j] + t * (corner[4 + j] - corner[j])
    for (let j = 0; j < 4; j++) corner[out + j] = kept[j]
  }
  toPicture(raster, corner, 0, raster.flat.vertexCount)
  toPicture(raster, corner, 1, raster.flat.vertexCount + 1)
  return true
}

function toClip({ flat, view }: Raster, part: number, vertex: number, slot: number) {
  const { positions } = flat
  const { matrix } = view
  for (let row = 0; row < 4; row++) {
    const o = part * 16 + row * 4
    corner[slot * 4 + row] =
      matrix[o] * positions[vertex * 3] +
      matrix[o + 1] * positions[vertex * 3 + 1] +
      matrix[o + 2] * positions[vertex * 3 + 2] +
      matrix[o + 3]
  }
}

function toPicture({ view }: Raster, from: Float64Array, slot: number, vertex: number) {
  const inverse = 1 / from[slot * 4 + 2]
  view.x[vertex] = from[slot * 4] * inverse
  view.y[vertex] = from[slot * 4 + 1] * inverse
  view.z[vertex] = (inverse - view.lens[DEPTH_ORIGIN]) * view.lens[DEPTH_SCALE]
}
