import { farInk, farInsideHalf, insideHalf } from '@/scene/frame/manner'
import { LEAN } from './view'
import type { Raster } from './types'

/** Ink this strong nearby means that an edge is drawn there already. */
const inked = 24
/** Planes that lean on each other by less than about this slope leave no line. */
const leastSlope = 0.25
/** Surfaces narrower than this share of a full one are left alone. */
const wide = 0.6

const most = 1 << 14
const at = new Int32Array(most)
const part = new Int32Array(most)
/** 3 a seam: signed distance of the pixel's centre from it, and its unit normal, in pixels. */
const line = new Float64Array(most * 3)

/**
 * Where two solids run into each other there is no edge to draw. Neighbouring pixels of different surfaces with no ink
 * near: carry both depth planes on; where they pass through each other between the two, that is the seam.
 */
export function inkSeams(raster: Raster) {
  const seams = findSeams(raster)
  for (let seam = 0; seam < seams; seam++) inkSeam(raster, seam)
}

function findSeams(raster: Raster) {
  const { flat, pixels, width, height, drawn } = raster
  const surfaceBits = ((1 << flat.surfaceBits) - 1) << 1
  let count = 0
  const left = Math.max(2, drawn[0])
  const right = Math.min(width - 3, drawn[2])
  const bottom = Math.min(height - 3, drawn[3])
  for (let y = Math.max(2, drawn[1]); y < bottom; y++) {
    const end = (y + 1) * width + right
    let p = (y + 1) * width + left
    let here = pixels[p]
    for (; p < end; p++) {
      const next = pixels[p + 1]
      const below = pixels[p + width]
      if (((here ^ next) & surfaceBits) !== 0) count = considerPair(raster, p, 1, width, count)
      if (((here ^ below) & surfaceBits) !== 0) count = considerPair(raster, p, width, 1, count)
      here = next
    }
  }
  return count
}

/** Two neighbouring pixels of different surfaces, `step` apart; `side` is the way across. */
function considerPair(raster: Raster, p: number, step: number, side: number, count: number) {
  const { flat, view, pixels, ink } = raster
  const { surfacePart } = flat
  const { thin } = view
  const q = p + step
  if (ink[p] > inked || ink[q] > inked) return count
  const surfaceMask = (1 << flat.surfaceBits) - 1
  const depthMask = -1 << (flat.surfaceBits + 1)
  const here = (pixels[p] >> 1) & surfaceMask
  const there = (pixels[q] >> 1) & surfaceMask
  if (here === 0 || there === 0 || thin[here] < wide || thin[there] < wide) return count
  const before = p - step
  const after = q + step
  if (((pixels[before] >> 1) & surfaceMask) !== here || ((pixels[after] >> 1) & surfaceMask) !== there)
    return count
  if (ink[before] > inked || ink[after] > inked) return count
  const zp = pixels[p] & depthMask
  const zq = pixels[q] & depthMask
  const slopeHere = zp - (pixels[before] & depthMask)
  const slopeThere = (pixels[after] & depthMask) - zq
  const gapHere = zp - (zq - slopeThere)
  const gapThere = zq - (zp + slopeHere)
  const lean = gapHere + gapThere
  // A bent surface leaves its plane within the pixel: the gaps may fall short by as much as the planes lean.
  if (lean < leastSlope * view.lens[LEAN] || gapHere < -lean || gapThere < -lean || count === most)
    return count
  // How the planes lean the other way, from a neighbour of each there; a strip one pixel wide has none.
  const besideHere = ((pixels[p - side] >> 1) & surfaceMask) === here ? -side : side
  const besideThere = ((pixels[q - side] >> 1) & surfaceMask) === there ? -side : side
  if (((pixels[p + besideHere] >> 1) & surfaceMask) !== here) return count
  if (((pixels[q + besideThere] >> 1) & surfaceMask) !== there) return count
  const tiltHere = (pixels[p + besideHere] & depthMask) - zp
  const tiltThere = (pixels[q + besideThere] & depthMask) - zq
  const otherLean = (besideThere > 0 ? tiltThere : -tiltThere) - (besideHere > 0 ? tiltHere : -tiltHere)
  // A seam that runs along the step is found by pairs the other way.
  if (otherLean > 1.5 * lean || otherLean < -1.5 * lean) return count
  const norm = 1 / Math.sqrt(lean * lean + otherLean * otherLean)
  at[count] = p
  part[count] =
    view.far[surfacePart[here]] > view.far[surfacePart[there]] ? surfacePart[here] : surfacePart[there]
  line[count * 3] = -Math.min(lean, Math.max(0, gapHere)) * norm
  line[count * 3 + 1] = (step === 1 ? lean : otherLean) * norm
  line[count * 3 + 2] = (step === 1 ? otherLean : lean) * norm
  return count + 1
}

/** A dash of two pixels' length across the pair that it was found at, like a piece of an inside line. */
function inkSeam({ view, ink, width, scale }: Raster, seam: number) {
  const far = view.far[part[seam]]
  const half = (insideHalf + (farInsideHalf - insideHalf) * far) * scale
  const reach = Math.max(0.5, half) + 0.5
  const full = 255 * Math.min(1, 2 * half) * (1 + (farInk - 1) * far)
  const span = Math.ceil(reach)
  const nx = line[seam * 3 + 1]
  const ny = line[seam * 3 + 2]
  for (let dy = -span; dy <= span; dy++)
    for (let dx = -span; dx <= span; dx++) {
      const distance = Math.abs(line[seam * 3] + dx * nx + dy * ny)
      const along = Math.abs(dx * ny - dy * nx)
      if (distance >= reach || along > 1) continue
      const value = full * Math.min(1, reach - distance)
      const pixel = at[seam] + dy * width + dx
      if (pixel >= 0 && pixel < ink.length && value > ink[pixel]) ink[pixel] = value
    }
}
