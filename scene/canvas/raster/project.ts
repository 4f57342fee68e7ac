import { HIDDEN } from '@/scene/frame/types'
import { clipFace } from './clip'
import { lightFrom, narrowWidth, thinnest } from '@/scene/frame/manner'
import { CROSSING, DEPTH_ORIGIN, DEPTH_SCALE, FOCAL } from './view'
import type { Raster } from './types'

/** Projects the vertices of every part drawn, and lists the faces that look at us with surface and tone. */
export function projectParts(raster: Raster) {
  const { view } = raster
  view.trueArea.fill(0)
  view.seenArea.fill(0)
  view.faces = 0
  view.spare = raster.flat.vertexCount + 2
  for (let i = 0; i < view.solidCount; i++) projectPart(raster, view.solids[i])
  view.solidFaces = view.faces
  for (let i = 0; i < view.ghostCount; i++) projectPart(raster, view.ghosts[i])
  for (let part = 0; part < raster.flat.partCount; part++)
    if (raster.visibility[part] !== HIDDEN) fillThin(raster, part)
}

function projectPart(raster: Raster, part: number) {
  projectVertices(raster, part)
  listFaces(raster, part)
}

function projectVertices({ flat, view }: Raster, part: number) {
  const { x, y, z, matrix, lens } = view
  const { positions } = flat
  const mesh = flat.partMesh[part]
  const o = part * 16
  const m0 = matrix[o], m1 = matrix[o + 1], m2 = matrix[o + 2], m3 = matrix[o + 3] // prettier-ignore
  const m4 = matrix[o + 4], m5 = matrix[o + 5], m6 = matrix[o + 6], m7 = matrix[o + 7] // prettier-ignore
  const m8 = matrix[o + 8], m9 = matrix[o + 9], m10 = matrix[o + 10], m11 = matrix[o + 11] // prettier-ignore
  const origin = lens[DEPTH_ORIGIN]
  const scale = lens[DEPTH_SCALE]
  let at = flat.partVertex[part]
  const end = flat.meshVertex[mesh + 1] * 3
  for (let i = flat.meshVertex[mesh] * 3; i < end; i += 3) {
    const px = positions[i]
    const py = positions[i + 1]
    const pz = positions[i + 2]
    const inverse = 1 / (m8 * px + m9 * py + m10 * pz + m11)
    x[at] = (m0 * px + m1 * py + m2 * pz + m3) * inverse
    y[at] = (m4 * px + m5 * py + m6 * pz + m7) * inverse
    z[at] = (inverse - origin) * scale
    at++
  }
}

function listFaces(raster: Raster, part: number) {
  const { flat, view } = raster
  const { facing, local, x, y, corners, codes, trueArea, seenArea } = view
  const { triangles, normals, offsets, areas, faceSurface } = flat
  const mesh = flat.partMesh[part]
  const q = part * 6
  const ex = local[q], ey = local[q + 1], ez = local[q + 2] // prettier-ignore
  const lx = local[q + 3], ly = local[q + 4], lz = local[q + 5] // prettier-ignore
  const firstVertex = flat.partVertex[part]
  const firstSurface = flat.partSurface[part]
  const firstFace = flat.meshFace[mesh]
  const crossing = view.state[part] === CROSSING
  let instance = flat.partFace[part]
  let listed = view.faces
  const end = flat.meshFace[mesh + 1]
  for (let face = firstFace; face < end; face++, instance++) {
    const f = face * 3
    const nx = normals[f]
    const ny = normals[f + 1]
    const nz = normals[f + 2]
    if (nx * ex + ny * ey + nz * ez <= offsets[face]) {
      facing[instance] = 0
      continue
    }
    facing[instance] = 1
    const a = firstVertex + triangles[f]
    const b = firstVertex + triangles[f + 1]
    const c = firstVertex + triangles[f + 2]
    const surface = firstSurface + faceSurface[face]
    const code = (surface << 1) | (nx * lx + ny * ly + nz * lz > lightFrom ? 1 : 0)
    if (crossing) {
      view.faces = listed
      clipFace(raster, part, face, code)
      listed = view.faces
      continue
    }
    const at = listed * 3
    corners[at] = a
    corners[at + 1] = b
    corners[at + 2] = c
    codes[listed++] = code
    const seen = (x[b] - x[a]) * (y[c] - y[a]) - (x[c] - x[a]) * (y[b] - y[a])
    trueArea[surface] += areas[face]
    seenArea[surface] += seen < 0 ? -seen / 2 : seen / 2
  }
  view.faces = listed
}

/** A surface a few pixels wide on screen (its own width, foreshortened as its faces are) gets thinner lines. */
function fillThin({ flat, view, scale }: Raster, part: number) {
  const pixelsAMetre = view.lens[FOCAL] / view.middle[part]
  for (let s = flat.partSurface[part]; s < flat.partSurface[part + 1]; s++) {
    const area = view.trueArea[s] * pixelsAMetre
    if (area <= 0 || view.state[part] === CROSSING) {
      view.thin[s] = 1
      continue
    }
    const width = (flat.surfaceWidth[s] * view.seenArea[s]) / area
    view.thin[s] = Math.min(1, Math.max(thinnest, width / (narrowWidth * scale)))
  }
}
