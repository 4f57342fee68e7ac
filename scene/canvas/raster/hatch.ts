import { farInk, hatchHalf, hatchPitch } from '@/scene/frame/manner'
import { FOCAL } from './view'
import type { Raster } from './types'

/**
 * Families by bank (LOOK.md 6): A single, B paired, C broken, D crossed, E dotted, F paired broken; further banks
 * begin again. Parts of no bank are hatched as A.
 */
const PAIRED = 1
const BROKEN = 2
const CROSSED = 3
const DOTTED = 4
const PAIRED_BROKEN = 5
const families = 6

/** Doubles a part in `view.hang`: a point on the picture, direction of the lines, strength of the ink. */
const HANG = 5

/**
 * Hangs the hatch of every part drawn that has cut faces on the part as it stands on the picture: it rides with it.
 * The lines lean 45° on the part's own y.
 */
export function hangHatch(raster: Raster) {
  const { view, flat } = raster
  for (let i = 0; i < view.solidCount; i++) if (flat.partCut[view.solids[i]]) hangPart(raster, view.solids[i])
}

function hangPart({ flat, view }: Raster, part: number) {
  const { matrix, lens, hang } = view
  const h = part * HANG
  const o = part * 16
  const b = flat.partMesh[part] * 6
  const px = (flat.boxes[b] + flat.boxes[b + 3]) / 2
  const py = (flat.boxes[b + 1] + flat.boxes[b + 4]) / 2
  const pz = (flat.boxes[b + 2] + flat.boxes[b + 5]) / 2
  const w = Math.max(1e-6, matrix[o + 8] * px + matrix[o + 9] * py + matrix[o + 10] * pz + matrix[o + 11])
  const x = (matrix[o] * px + matrix[o + 1] * py + matrix[o + 2] * pz + matrix[o + 3]) / w
  const y = (matrix[o + 4] * px + matrix[o + 5] * py + matrix[o + 6] * pz + matrix[o + 7]) / w
  // Its own y on the picture.
  let sx = (matrix[o + 1] - x * matrix[o + 9]) / w
  let sy = (matrix[o + 5] - y * matrix[o + 9]) / w
  if (Math.sqrt(sx * sx + sy * sy) * w < 0.3 * lens[FOCAL]) {
    // We look along it: lean on the crank's direction instead.
    sx = matrix[o + 2] - x * matrix[o + 10]
    sy = matrix[o + 6] - y * matrix[o + 10]
  }
  const length = Math.sqrt(sx * sx + sy * sy) || 1
  hang[h] = x
  hang[h + 1] = y
  hang[h + 2] = (sx - sy) / length / Math.SQRT2
  hang[h + 3] = (sx + sy) / length / Math.SQRT2
  hang[h + 4] = 255 * (1 + (farInk - 1) * view.far[part])
}

/** Hatches a row of pixels of a cut face, left … right (left out), where that surface shows. */
export function hatchRow(raster: Raster, surface: number, y: number, left: number, right: number) {
  const { flat, view, pixels, ink, width, scale } = raster
  const { hang } = view
  const surfaceMask = (1 << flat.surfaceBits) - 1
  const part = flat.surfacePart[surface]
  const h = part * HANG
  const family = Math.max(0, flat.partBank[part]) % families
  const cos = hang[h + 2]
  const sin = hang[h + 3]
  const thickness = hatchHalf * scale
  const half = Math.max(0.5, thickness)
  const full = hang[h + 4] * Math.min(1, 2 * thickness)
  const pitch = hatchPitch * scale
  const dy = y + 0.5 - hang[h + 1]
  const base = (y + 1) * width
  for (let x = left; x < right; x++) {
    if (((pixels[base + x] >> 1) & surfaceMask) !== surface) continue
    const dx = x + 0.5 - hang[h]
    const along = dx * cos + dy * sin
    const across = dy * cos - dx * sin
    const pair = family === PAIRED || family === PAIRED_BROKEN
    const spacing = pair ? 1.6 * pitch : pitch
    let distance = toMiddle(across, spacing)
    if (pair) distance = Math.abs(distance - 0.25 * pitch)
    // Each line is shifted along itself by half against the next.
    const shift = Math.floor(across / spacing) & 1 ? 0.5 : 0
    if (family === CROSSED) distance = Math.min(distance, toMiddle(along, pitch))
    else if (family === BROKEN || family === PAIRED_BROKEN) {
      const dash = 9 * scale
      const inGap = dash / 6 - toMiddle(along + shift * dash, dash)
      if (inGap > 0) distance = Math.sqrt(distance * distance + inGap * inGap)
    } else if (family === DOTTED) {
      const beside = toMiddle(along + shift * 0.72 * pitch, 0.72 * pitch)
      distance = Math.sqrt(distance * distance + beside * beside) - 0.3 * scale
    }
    const edge = half + 0.5 - distance
    if (edge <= 0) continue
    const value = edge >= 1 ? full : full * edge
    if (value > ink[base + x]) ink[base + x] = value
  }
}

/** Distance from the middle of the step that a place falls into. */
function toMiddle(place: number, step: number) {
  const steps = place / step
  return Math.abs(steps - Math.floor(steps) - 0.5) * step
}
