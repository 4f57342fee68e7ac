import sharp from 'sharp'

/** An opaque picture as PNG. A drawing has few tones: a palette of them takes a third of the room. */
export const encodePng = (rgba: Uint8ClampedArray, width: number, height: number): Promise<Buffer> =>
  sharp(rgba, { raw: { width, height, channels: 4 } })
    .removeAlpha()
    .png({ palette: true, colours: 128, dither: 0, effort: 7 })
    .toBuffer()
