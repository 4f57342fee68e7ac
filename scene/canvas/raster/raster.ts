import { SHOWN, type InkTheme, type Visibility } from '@/scene/frame/types'
import { createPalette, loadTheme, type Palette } from './palette'
import { flattenRig, type FlatRig, type RigShape } from './prepare'
import { createRuns, type Runs } from './runs'
import { createView, type View } from './view'

/** Everything one picture is drawn in. Allocated with the rig and the size, never with a frame. */
export interface Raster {
  flat: FlatRig
  view: View
  runs: Runs
  palette: Palette
  visibility: Visibility
  width: number
  height: number
  /** Picture pixels a CSS pixel: line widths and hatch grow with it. */
  scale: number
  /** Depth, surface and tone a pixel, nearest greatest, 0 is paper; one row more above and below. */
  pixels: Int32Array
  /** The same for ghosts, made when the first ghost is drawn. */
  ghostPixels: Int32Array
  /** Coverage by ink, with the same extra rows. */
  ink: Uint8Array
  /** RGBA in memory order, `width` × `height`. */
  image: Uint32Array<ArrayBuffer>
  /** What the last picture drew: x0, y0, x1, y1 (ends left out). */
  drawn: Int32Array
  /** What must be put on the canvas: the last picture's box united with this one's. */
  dirty: Int32Array
  /** The next picture covers everything: new size or colours. */
  whole: boolean
  /** Still picture: sums of samples, made when the first is refined. */
  sumRedBlue: Uint32Array
  sumGreen: Uint32Array
}

export interface RasterFrame {
  pose: Float64Array
  viewProjection: Float64Array
  eye: Float64Array
  tint: Float32Array
}

export function createRaster(rig: RigShape, theme: InkTheme): Raster {
  const raster: Raster = {
    ...rigBuffers(rig),
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
