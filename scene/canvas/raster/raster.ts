import { SHOWN, type InkTheme, type Visibility } from '@/scene/frame/types'
import { createPalette, loadTheme } from './palette'
import { flattenRig, type RigShape } from './prepare'
import { createRuns } from './runs'
import type { Fine, Raster } from './types'
import { createView } from './view'

export function createRaster(rig: RigShape, theme: InkTheme, fine: Fine | null): Raster {
  const raster: Raster = {
    ...rigBuffers(rig),
    fine,
    width: 0,
    height: 0,
    scale: 1,
    pixels: new Int32Array(0),
    ghostPixels: new Int32Array(0),
    ink: new Uint8Array(0),
    image: new Uint32Array(0),
    drawn: new Int32Array(4),
    dirty: new Int32Array(4),
    whole: true,
    sumRedBlue: new Uint32Array(0),
    sumGreen: new Uint32Array(0),
  }
  setTheme(raster, theme)
  return raster
}

function rigBuffers(rig: RigShape) {
  const flat = flattenRig(rig)
  return {
    flat,
    view: createView(flat),
    runs: createRuns(flat),
    palette: createPalette(flat),
    visibility: new Uint8Array(flat.partCount).fill(SHOWN),
  }
}

/** Another rig on the same sheet, all of it shown. */
export function setRig(raster: Raster, rig: RigShape) {
  const { theme } = raster.palette
  Object.assign(raster, rigBuffers(rig))
  setTheme(raster, theme)
}

export function setTheme(raster: Raster, theme: InkTheme) {
  loadTheme(raster.palette, theme)
  raster.whole = true
}

export function setVisibility(raster: Raster, visibility: Visibility) {
  raster.visibility.set(visibility.subarray(0, raster.flat.partCount))
}

/** Picture size in pixels, and how many of them make a CSS pixel. */
export function setSize(raster: Raster, width: number, height: number, scale: number) {
  if (raster.width === width && raster.height === height && raster.scale === scale) return
  const padded = width * (height + 2)
  raster.width = width
  raster.height = height
  raster.scale = scale
  raster.pixels = new Int32Array(padded)
  raster.ink = new Uint8Array(padded)
  raster.image = new Uint32Array(width * height)
  raster.ghostPixels = new Int32Array(0)
  raster.sumRedBlue = new Uint32Array(0)
  raster.sumGreen = new Uint32Array(0)
  raster.drawn.fill(0)
  raster.whole = true
}
