import { compose } from './compose'
import { fillFaces } from './faces'
import { inkLines } from './lines'
import { fillPalette } from './palette'
import { projectParts } from './project'
import { outlineHalf } from '@/scene/frame/manner'
import { fillView, JITTER_X, JITTER_Y } from './view'
import type { Raster, RasterFrame, View } from './types'

/** Draws one picture into `raster.image`; what changed of it is `raster.dirty`. */
export function paint(raster: Raster, frame: RasterFrame) {
  const { view, fine } = raster
  fillView(raster, frame)
  moveBoxes(raster)
  clear(raster.pixels, raster, raster.dirty)
  clear(raster.ink, raster, raster.dirty)
  projectParts(raster)
  view.lens[JITTER_X] = view.lens[JITTER_Y] = 0
  fillFaces(raster, raster.pixels, 0, view.solidFaces, null)
  fillGhosts(raster)
  inkLines(raster)
  if (fine) {
    fine.inkSeams(raster)
    fine.hangHatch(raster)
    fillFaces(raster, raster.pixels, 0, view.solidFaces, fine.hatchRow)
  }
  fillPalette(raster, frame)
  compose(raster)
}

function fillGhosts(raster: Raster) {
  const { view, pixels } = raster
  if (view.ghostCount === 0) return
  if (raster.ghostPixels.length !== pixels.length) raster.ghostPixels = new Int32Array(pixels.length)
  else raster.ghostPixels.fill(0)
  fillFaces(raster, raster.ghostPixels, view.solidFaces, view.faces, null)
}

/** The dirty box is the last picture's united with this one's; the whole picture after new colours or a new size. */
function moveBoxes(raster: Raster) {
  const { drawn, dirty, view, width, height } = raster
  dirty.set(drawn)
  const reach = Math.ceil(outlineHalf * raster.scale) + 2
  drawn[0] = width
  drawn[1] = height
  drawn[2] = drawn[3] = 0
  growBox(raster, view.solids, view.solidCount, reach)
  growBox(raster, view.ghosts, view.ghostCount, reach)
  if (drawn[0] >= drawn[2] || drawn[1] >= drawn[3]) drawn.fill(0)
  const empty = dirty[0] >= dirty[2]
  dirty[0] = empty ? drawn[0] : Math.min(dirty[0], drawn[0])
  dirty[1] = empty ? drawn[1] : Math.min(dirty[1], drawn[1])
  dirty[2] = Math.max(dirty[2], drawn[2])
  dirty[3] = Math.max(dirty[3], drawn[3])
  if (raster.whole) {
    raster.whole = false
    dirty[0] = dirty[1] = 0
    dirty[2] = width
    dirty[3] = height
  }
}

function growBox({ drawn, view, width, height }: Raster, list: View['solids'], count: number, reach: number) {
  for (let i = 0; i < count; i++) {
    const o = list[i] * 4
    drawn[0] = Math.max(0, Math.min(drawn[0], Math.floor(view.box[o]) - reach))
    drawn[1] = Math.max(0, Math.min(drawn[1], Math.floor(view.box[o + 1]) - reach))
    drawn[2] = Math.min(width, Math.max(drawn[2], Math.ceil(view.box[o + 2]) + reach))
    drawn[3] = Math.min(height, Math.max(drawn[3], Math.ceil(view.box[o + 3]) + reach))
  }
}

export function clear(buffer: Int32Array | Uint8Array, { width }: Raster, box: Int32Array) {
  for (let y = box[1]; y < box[3]; y++) buffer.fill(0, (y + 1) * width + box[0], (y + 1) * width + box[2])
}
