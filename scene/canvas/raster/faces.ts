import { JITTER_X, JITTER_Y } from './view'
import type { Fine, Raster } from './types'

/** Makes picture coordinates positive, so that cutting off the fraction rounds down. */
const whole = 1 << 20
const bias = whole + 1

/**
 * Fills the listed faces from…to into a depth buffer (nearest greatest). A pixel belongs to the face its centre
 * lies in; the ends of a row are found from the upper vertex of each side, so that two faces that share a side
 * share every rounding too: no gap, no overlap. Depth, surface and tone are one number: one compare, one store.
 * With `hatchRow`, nothing is filled: the rows of cut faces are hatched where they show.
 */
export function fillFaces(
  raster: Raster,
  pixels: Int32Array,
  from: number,
  to: number,
  hatchRow: Fine['hatchRow'] | null,
) {
  const { view, flat, width, height } = raster
  const { surfaceCut } = flat
  const { x, y, z, corners, codes, lens } = view
  const depthMask = -1 << (flat.surfaceBits + 1)
  const jitterX = lens[JITTER_X] - 0.5
  const jitterY = lens[JITTER_Y] - 0.5
  for (let face = from; face < to; face++) {
    const code = codes[face]
    if (hatchRow && surfaceCut[code >> 1] === 0) continue
    let top = corners[face * 3]
    let mid = corners[face * 3 + 1]
    let low = corners[face * 3 + 2]
    let other = top
    if (y[mid] < y[top]) {
      top = mid
      mid = other
    }
    if (y[low] < y[mid]) {
      other = low
      low = mid
      mid = other
    }
    if (y[mid] < y[top]) {
      other = mid
      mid = top
      top = other
    }
    const topX = x[top] + jitterX
    const topY = y[top] + jitterY
    const midX = x[mid] + jitterX
    const midY = y[mid] + jitterY
    const lowX = x[low] + jitterX
    const lowY = y[low] + jitterY
    let row = Math.ceil(topY)
    let end = Math.ceil(lowY)
    if (row < 0) row = 0
    if (end > height) end = height
    if (row >= end) continue
    const area = (midX - topX) * (lowY - topY) - (lowX - topX) * (midY - topY)
    if (area === 0) continue
    const topZ = z[top]
    const midZ = z[mid] - topZ
    const lowZ = z[low] - topZ
    // A sliver's slope is noise: it lies flat.
    const share = area > 0.01 || area < -0.01 ? 1 / area : 0
    const perX = (midZ * (lowY - topY) - lowZ * (midY - topY)) * share
    const perY = ((midX - topX) * lowZ - (lowX - topX) * midZ) * share
    const stepZ = perX | 0
    // Sides are followed at row centres from their upper ends; the first pixel right of one is its whole part + 1.
    const longStep = (lowX - topX) / (lowY - topY)
    let longX = topX + (row - topY) * longStep + bias
    let turn = Math.ceil(midY)
    if (turn > end) turn = end
    let rowZ = topZ + (row - topY) * perY - topX * perX
    let base = (row + 1) * width
    for (let half = 0; half < 2; half++) {
      const stop = half === 0 ? turn : end
      if (row >= stop) continue
      const fromX = half === 0 ? topX : midX
      const fromY = half === 0 ? topY : midY
      const shortStep = half === 0 ? (midX - topX) / (midY - topY) : (lowX - midX) / (lowY - midY)
      let shortX = fromX + (row - fromY) * shortStep + bias
      for (; row < stop; row++) {
        let left = ((area > 0 ? longX : shortX) | 0) - whole
        let right = ((area > 0 ? shortX : longX) | 0) - whole
        longX += longStep
        shortX += shortStep
        if (left < 0) left = 0
        if (right > width) right = width
        if (left < right) {
          if (hatchRow) hatchRow(raster, code >> 1, row, left, right)
          else {
            let depth = (rowZ + left * perX) | 0
            const last = base + right
            for (let at = base + left; at < last; at++) {
              const value = (depth & depthMask) | code
              if (value > pixels[at]) pixels[at] = value
              depth = (depth + stepZ) | 0
            }
          }
        }
        rowZ += perY
        base += width
      }
    }
  }
}
