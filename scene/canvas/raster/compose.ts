import type { Raster } from './types'

/** Fill and ink of every pixel in the dirty box, looked up in the palette. */
export function compose({ palette, pixels, ink, image, dirty, flat, width }: Raster) {
  const { colours, fillOf } = palette
  const codeMask = (1 << (flat.surfaceBits + 1)) - 1
  const paper = colours[0]
  const columns = dirty[2] - dirty[0]
  for (let y = dirty[1]; y < dirty[3]; y++) {
    let at = y * width + dirty[0]
    let from = at + width
    for (const end = at + columns; at < end; at++, from++) {
      const cover = ink[from]
      const code = pixels[from] & codeMask
      image[at] = code === 0 && cover === 0 ? paper : colours[fillOf[code] + cover]
    }
  }
}
