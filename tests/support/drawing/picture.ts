import { fine } from '@/scene/canvas/raster/fine'
import { paint } from '@/scene/canvas/raster/paint'
import type { RigShape } from '@/scene/canvas/raster/prepare'
import { createRaster, setSize, setVisibility } from '@/scene/canvas/raster/raster'
import type { InkTheme } from '@/scene/frame/types'
import { vellum } from './small-rig'
import type { Raster, RasterFrame } from '@/scene/canvas/raster/types'

export interface Sheet {
  theme?: InkTheme
  visibility?: number[]
  width?: number
  height?: number
  scale?: number
}

/** One picture in a fresh raster. */
export function drawn(rig: RigShape, frame: RasterFrame, sheet: Sheet = {}): Raster {
  const { theme = vellum, visibility, width = 200, height = 200, scale = 1 } = sheet
  const raster = createRaster(rig, theme, fine)
  if (visibility) setVisibility(raster, Uint8Array.from(visibility))
  setSize(raster, width, height, scale)
  paint(raster, frame)
  return raster
}

/** Colour at a pixel, 0xRRGGBB. */
export function colourAt({ image, width }: Raster, x: number, y: number) {
  const pixel = image[y * width + x]
  return ((pixel & 255) << 16) | (pixel & 0xff00) | ((pixel >> 16) & 255)
}

/** Coverage by ink at a pixel, 0 … 255. */
export const inkAt = ({ ink, width }: Raster, x: number, y: number) => ink[(y + 1) * width + x]

/** The part at a pixel, −1 for paper. */
export function partAt({ pixels, width, flat }: Raster, x: number, y: number) {
  return flat.surfacePart[(pixels[(y + 1) * width + x] >> 1) & ((1 << flat.surfaceBits) - 1)]
}

/** All the ink in a box of pixels, in full pixels. */
export function inkIn(raster: Raster, x0: number, y0: number, x1: number, y1: number) {
  let sum = 0
  for (let y = y0; y < y1; y++) for (let x = x0; x < x1; x++) sum += inkAt(raster, x, y)
  return sum / 255
}

export function count({ width, height }: Raster, holds: (x: number, y: number) => boolean) {
  let pixels = 0
  for (let y = 0; y < height; y++) for (let x = 0; x < width; x++) if (holds(x, y)) pixels++
  return pixels
}
