/** The canvas that finished pixels are put on. */
export interface Sheet {
  resize(width: number, height: number): void
  /** Puts the box x0, y0, x1, y1 of an image as large as the sheet. */
  put(image: Uint32Array<ArrayBuffer>, box: Int32Array): void
}

/** Null where the canvas cannot be drawn on. */
export function createSheet(canvas: HTMLCanvasElement | OffscreenCanvas): Sheet | null {
  const context = canvas.getContext('2d', { alpha: false }) as
    CanvasRenderingContext2D | OffscreenCanvasRenderingContext2D | null
  if (!context) return null
  let image: Uint32Array | undefined
  let data: ImageData | undefined
  return {
    resize(width, height) {
      canvas.width = width
      canvas.height = height
    },
    put(next, box) {
      if (!data || next !== image) {
        image = next
        data = new ImageData(new Uint8ClampedArray(next.buffer), canvas.width, canvas.height)
      }
      if (box[2] > box[0] && box[3] > box[1])
        context.putImageData(data, 0, 0, box[0], box[1], box[2] - box[0], box[3] - box[1])
    },
  }
}
