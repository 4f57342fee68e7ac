import sharp from 'sharp'

const shrink = 4

/** Edge strength of a picture at a quarter of its size: there a pixel's shift of a line hardly counts. */
async function edges(png: Buffer) {
  const { width = 0, height = 0 } = await sharp(png).metadata()
  const [w, h] = [Math.round(width / shrink), Math.round(height / shrink)]
  const grey = await sharp(png).resize(w, h, { kernel: 'cubic' }).greyscale().raw().toBuffer()
  const out = new Float64Array(w * h)
  for (let y = 1; y < h - 1; y++)
    for (let x = 1; x < w - 1; x++) {
      const at = y * w + x
      out[at] = Math.hypot(grey[at + 1] - grey[at - 1], grey[at + w] - grey[at - w])
    }
  return out
}

/** 0 for one picture, 1 for two that have no edge in common. */
export async function edgeDifference(one: Buffer, other: Buffer): Promise<number> {
  const [a, b] = [await edges(one), await edges(other)]
  let apart = 0
  let all = 0
  for (let i = 0; i < a.length; i++) {
    apart += Math.abs(a[i] - b[i])
    all += Math.max(a[i], b[i])
  }
  return apart / all
}

/** Colour of a pixel, 0…255 each. */
export async function colourAt(png: Buffer, x: number, y: number): Promise<number[]> {
  const raw = await sharp(png)
    .removeAlpha()
    .extract({ left: x, top: y, width: 1, height: 1 })
    .raw()
    .toBuffer()
  return [...raw]
}
