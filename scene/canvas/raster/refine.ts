import { fillFaces } from './faces'
import { clear } from './paint'
import { JITTER_X, JITTER_Y } from './view'
import type { Raster } from './types'

/** Still pictures are shown after this many samples, then after all of them. */
export const firstSamples = 4
export const allSamples = 16

/**
 * Sixteen places in a pixel, one in each row and column of a 16 × 16 grid; the first four lie one in each quarter.
 * In sixteenths from the pixel's corner.
 */
const places = [
  1, 6, 13, 2, 3, 14, 10, 11, 6, 9, 8, 4, 15, 7, 0, 12, 9, 0, 4, 10, 12, 5, 7, 15, 2, 3, 14, 13, 5, 1, 11, 8,
]

/**
 * Refines the picture last painted: tones are averaged over faces filled at `sample` more places, while lines and
 * hatch stay as they were drawn. Samples are added in turn, from 0; `showSamples` puts them into the image.
 */
export function addSample(raster: Raster, sample: number) {
  const { view, pixels, palette, drawn, flat, width, height } = raster
  if (raster.sumGreen.length !== width * height) {
    raster.sumRedBlue = new Uint32Array(width * height)
    raster.sumGreen = new Uint32Array(width * height)
  }
  const { sumRedBlue, sumGreen } = raster
  clear(pixels, raster, drawn)
  view.lens[JITTER_X] = 0.5 - (places[sample * 2] + 0.5) / 16
  view.lens[JITTER_Y] = 0.5 - (places[sample * 2 + 1] + 0.5) / 16
  fillFaces(raster, pixels, 0, view.solidFaces, null)
  const { colours, fillOf } = palette
  const codeMask = (1 << (flat.surfaceBits + 1)) - 1
  for (let y = drawn[1]; y < drawn[3]; y++)
    for (let x = drawn[0]; x < drawn[2]; x++) {
      const at = y * width + x
      const colour = colours[fillOf[pixels[at + width] & codeMask]]
      const redBlue = colour & 0xff00ff
      const green = (colour >> 8) & 255
      sumRedBlue[at] = sample === 0 ? redBlue : sumRedBlue[at] + redBlue
      sumGreen[at] = sample === 0 ? green : sumGreen[at] + green
    }
}

/** Writes the mean of the samples added so far, inked, into the image. The box to put is `raster.drawn`. */
export function showSamples(raster: Raster, samples: number) {
  const { ink, image, sumRedBlue, sumGreen, drawn, width, palette } = raster
  const inkColour = palette.colours[255]
  const inkRed = inkColour & 255
  const inkGreen = (inkColour >> 8) & 255
  const inkBlue = (inkColour >> 16) & 255
  const half = samples >> 1
  for (let y = drawn[1]; y < drawn[3]; y++)
    for (let x = drawn[0]; x < drawn[2]; x++) {
      const at = y * width + x
      let red = (((sumRedBlue[at] & 0xffff) + half) / samples) | 0
      let green = ((sumGreen[at] + half) / samples) | 0
      let blue = (((sumRedBlue[at] >>> 16) + half) / samples) | 0
      const cover = ink[at + width]
      if (cover !== 0) {
        red += Math.round(((inkRed - red) * cover) / 255)
        green += Math.round(((inkGreen - green) * cover) / 255)
        blue += Math.round(((inkBlue - blue) * cover) / 255)
      }
      image[at] = 0xff000000 | (blue << 16) | (green << 8) | red
    }
}
