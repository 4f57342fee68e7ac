import { fillFar } from '@/scene/frame/banks'
import { GHOST, HIDDEN } from '@/scene/frame/types'
import type { FlatRig } from './prepare'
import { light } from '@/scene/frame/manner'
import type { Raster, RasterFrame, View } from './types'

/** Depth takes the upper bits of a positive 32-bit number. */
export const depthRange = 2 ** 31
const depthMargin = 0.02

export const AWAY = 0 // hidden or off the picture
export const WHOLE = 1
export const CROSSING = 2 // cut by the near plane: goes the slow way

export const FOCAL = 0 // pixels a metre at w = 1
export const DEPTH_ORIGIN = 1 // depth = (1/w − origin) · scale
export const DEPTH_SCALE = 2
export const JITTER_X = 3
export const JITTER_Y = 4
/** How much depth changes over a pixel of a plane that leans 45°, about the middle of the range. */
export const LEAN = 5
/** Lengths of the rows of the view: right, up and towards what is looked at; dw / d(distance from the near plane). */
const RIGHT = 6
const UP = 7
const ONWARD = 8
const NEAR_SLOPE = 9

export function createView(flat: FlatRig): View {
  const parts = flat.partCount
  const vertices = flat.vertexCount + 2 + flat.faceCount
  return {
    matrix: new Float64Array(parts * 16),
    state: new Uint8Array(parts),
    box: new Float64Array(parts * 4),
    inverses: new Float64Array(parts * 2),
    middle: new Float64Array(parts),
    local: new Float64Array(parts * 6),
    far: new Float64Array(parts),
    hang: new Float64Array(parts * 5),
    solids: new Int32Array(parts),
    solidCount: 0,
    ghosts: new Int32Array(parts),
    ghostCount: 0,
    x: new Float64Array(vertices),
    y: new Float64Array(vertices),
    z: new Float64Array(vertices),
    spare: 0,
    facing: new Uint8Array(flat.faceCount),
    thin: new Float64Array(flat.surfaceCount),
    trueArea: new Float64Array(flat.surfaceCount),
    seenArea: new Float64Array(flat.surfaceCount),
    corners: new Int32Array(flat.faceCount * 6),
    codes: new Int32Array(flat.faceCount * 2),
    solidFaces: 0,
    faces: 0,
    lens: new Float64Array(10),
  }
}

/** Moves the parts before the eye, finds their boxes on the picture, fits the depth and sorts them. */
export function fillView(raster: Raster, frame: RasterFrame) {
  const { flat, view, visibility, width, height } = raster
  const { lens } = view
  const m = frame.viewProjection
  lens[RIGHT] = Math.sqrt(m[0] * m[0] + m[4] * m[4] + m[8] * m[8])
  lens[UP] = Math.sqrt(m[1] * m[1] + m[5] * m[5] + m[9] * m[9])
  lens[ONWARD] = Math.sqrt(m[3] * m[3] + m[7] * m[7] + m[11] * m[11])
  lens[NEAR_SLOPE] = lens[ONWARD] / Math.sqrt((m[2] + m[3]) ** 2 + (m[6] + m[7]) ** 2 + (m[10] + m[11]) ** 2)
  lens[FOCAL] = (lens[UP] * height) / 2
  view.solidCount = view.ghostCount = 0
  let nearest = 0
  let farthest = Infinity
  for (let part = 0; part < flat.partCount; part++) {
    view.state[part] = AWAY
    if (visibility[part] === HIDDEN) continue
    placePart(raster, frame, part)
    boxPart(raster, part)
    if (view.state[part] === AWAY) continue
    farthest = Math.min(farthest, view.inverses[part * 2])
    nearest = Math.max(nearest, view.inverses[part * 2 + 1])
    const o = part * 4
    const outside =
      view.box[o] >= width || view.box[o + 1] >= height || view.box[o + 2] <= 0 || view.box[o + 3] <= 0
    if (outside) view.state[part] = AWAY
    else if (visibility[part] === GHOST) view.ghosts[view.ghostCount++] = part
    else view.solids[view.solidCount++] = part
  }
  const span = Math.max(nearest - farthest, nearest * 1e-6)
  lens[DEPTH_ORIGIN] = farthest - span * depthMargin
  lens[DEPTH_SCALE] = nearest > 0 ? depthRange / (span * (1 + 2 * depthMargin)) : 0
  lens[LEAN] = lens[FOCAL] > 0 ? (lens[DEPTH_SCALE] * (nearest + farthest)) / 2 / lens[FOCAL] : 0
  sortNearestFirst(view.solids, view.solidCount, view.middle)
  placeFar(raster, frame)
}

function placePart({ view, width, height }: Raster, frame: RasterFrame, part: number) {
  const m = frame.viewProjection
  const { matrix, local, lens } = view
  const p = part * 4
  const cos = frame.pose[p]
  const sin = frame.pose[p + 1]
  const tx = frame.pose[p + 2]
  const ty = frame.pose[p + 3]
  const halfWidth = width / 2
  const halfHeight = height / 2
  const o = part * 16
  for (let row = 0; row < 4; row++) {
    for (let k = 0; k < 4; k++) {
      const at = k * 4
      const w = m[at + 3]
      const value =
        row === 0
          ? (m[at] + w) * halfWidth
          : row === 1
            ? (w - m[at + 1]) * halfHeight
            : row === 2
              ? w
              : m[at + 2] + w
      matrix[o + row * 4 + k] = value
    }
    const r = o + row * 4
    const a = matrix[r]
    const b = matrix[r + 1]
    matrix[r] = a * cos + b * sin
    matrix[r + 1] = b * cos - a * sin
    matrix[r + 3] += a * tx + b * ty
  }
  const q = part * 6
  const ex = frame.eye[0] - tx
  const ey = frame.eye[1] - ty
  local[q] = ex * cos + ey * sin
  local[q + 1] = ey * cos - ex * sin
  local[q + 2] = frame.eye[2]
  const right = light.right / lens[RIGHT]
  const up = light.up / lens[UP]
  const toEye = -light.toEye / lens[ONWARD]
  const lx = right * m[0] + up * m[1] + toEye * m[3]
  const ly = right * m[4] + up * m[5] + toEye * m[7]
  local[q + 3] = lx * cos + ly * sin
  local[q + 4] = ly * cos - lx * sin
  local[q + 5] = right * m[8] + up * m[9] + toEye * m[11]
}

/** Box of a part on the picture, its state, and the least and greatest 1/w of it. */
function boxPart({ flat, view, width, height }: Raster, part: number) {
  const { matrix, box } = view
  const o = part * 16
  const b = flat.partMesh[part] * 6
  let minX = Infinity
  let minY = Infinity
  let maxX = -Infinity
  let maxY = -Infinity
  let nearest = 0
  let farthest = Infinity
  let sum = 0
  let behind = 0
  for (let corner = 0; corner < 8; corner++) {
    const px = flat.boxes[b + (corner & 1 ? 3 : 0)]
    const py = flat.boxes[b + (corner & 2 ? 4 : 1)]
    const pz = flat.boxes[b + (corner & 4 ? 5 : 2)]
    const w = matrix[o + 8] * px + matrix[o + 9] * py + matrix[o + 10] * pz + matrix[o + 11]
    const distance = matrix[o + 12] * px + matrix[o + 13] * py + matrix[o + 14] * pz + matrix[o + 15]
    sum += w
    // At the near plane w is the depth there: w − distance·(dw/d distance), both linear along the eye's axis.
    const seen = distance > 0 ? w : w - distance * view.lens[NEAR_SLOPE]
    nearest = Math.max(nearest, 1 / seen)
    farthest = Math.min(farthest, 1 / seen)
    if (distance <= 0) {
      behind++
      continue
    }
    const x = (matrix[o] * px + matrix[o + 1] * py + matrix[o + 2] * pz + matrix[o + 3]) / w
    const y = (matrix[o + 4] * px + matrix[o + 5] * py + matrix[o + 6] * pz + matrix[o + 7]) / w
    if (x < minX) minX = x
    if (x > maxX) maxX = x
    if (y < minY) minY = y
    if (y > maxY) maxY = y
  }
  view.middle[part] = sum / 8
  view.state[part] = behind === 0 ? WHOLE : behind === 8 ? AWAY : CROSSING
  const crossing = view.state[part] === CROSSING
  box[part * 4] = crossing ? 0 : minX
  box[part * 4 + 1] = crossing ? 0 : minY
  box[part * 4 + 2] = crossing ? width : maxX
  box[part * 4 + 3] = crossing ? height : maxY
  view.inverses[part * 2] = farthest
  view.inverses[part * 2 + 1] = nearest
}

function sortNearestFirst(list: Int32Array, count: number, key: Float64Array) {
  for (let i = 1; i < count; i++) {
    const part = list[i]
    let j = i
    while (j > 0 && key[list[j - 1]] > key[part]) {
      list[j] = list[j - 1]
      j--
    }
    list[j] = part
  }
}

/** The parts of a bank stand as far back as it does. */
function placeFar({ flat, view }: Raster, frame: RasterFrame) {
  const { banks, partBank, partCount } = flat
  fillFar(banks, frame.viewProjection)
  for (let part = 0; part < partCount; part++)
    view.far[part] = partBank[part] < 0 ? 0 : banks.far[partBank[part]]
}
