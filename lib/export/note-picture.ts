import type { StillDrawing } from '@/scene/model/still-drawing'
import type { Columns } from './flow'
import { inks } from './inks'
import type { Box } from './sheet-frame'
import type { Element, Tags } from './tagged'
import type { Typesetter } from './typesetter'

/** The view of a note: the engine as PNG, its pin, and what was drawn over it. Sizes in points. */
export interface PrintedPicture {
  png: Uint8Array<ArrayBuffer>
  width: number
  height: number
  /** In shares of width and height; null where the pinned point is not on the picture. */
  pin: [number, number] | null
  label: string
  drawing: StillDrawing | null
  /** What is to be seen, in words. */
  words: string
}

const radius = 6.5

export function notePicture(
  type: Typesetter,
  tags: Tags,
  parent: Element,
  columns: Columns,
  picture: PrintedPicture,
): void {
  const { pdf } = type
  const { width, height, png, pin, label, drawing, words } = picture
  columns.room(height + 8)
  const box = { x: columns.x, y: columns.y + 4, width, height }
  tags.draw(
    parent,
    'Figure',
    () => {
      pdf.image(png.buffer, box.x, box.y, { width, height })
      pdf.lineWidth(0.5).strokeColor(inks.line).rect(box.x, box.y, width, height).stroke()
      pdf.save()
      pdf.rect(box.x, box.y, width, height).clip()
      if (drawing) drawShapes(type, drawing, box)
      if (pin) drawPin(type, box, pin, label)
      pdf.restore()
    },
    { alt: words },
  )
  columns.y += height + 8
}

/** A flag beside the point, its leader ending on it in a dot. */
function drawPin(type: Typesetter, box: Box, [across, down]: [number, number], label: string) {
  const { pdf } = type
  const [x, y] = [box.x + across * box.width, box.y + down * box.height]
  const [flagX, flagY] = [x + (across > 0.85 ? -24 : 24), y + (down < 0.15 ? 20 : -20)]
  pdf.lineWidth(0.9).strokeColor(inks.pencil).moveTo(x, y).lineTo(flagX, flagY).stroke()
  pdf.circle(x, y, 1.8).fill(inks.pencil)
  pdf.circle(flagX, flagY, radius).fillAndStroke(inks.paper, inks.pencil)
  type.line(label, flagX, flagY + 2.4, { face: 'figure', size: 6.6, colour: inks.pencil }, 'middle')
}

/** Shares of the picture it was drawn on; one of other proportions has the same height and the same middle. */
function drawShapes({ pdf }: Typesetter, { shapes, aspect }: StillDrawing, box: Box) {
  const at = ([across, down]: readonly [number, number]): [number, number] => [
    box.x + box.width / 2 + (across - 0.5) * aspect * box.height,
    box.y + down * box.height,
  ]
  pdf.lineWidth(1.2).strokeColor(inks.pencil)
  for (const shape of shapes) {
    if (shape.shape === 'freehand') {
      const [first, ...rest] = shape.points.map(at)
      pdf.moveTo(...first)
      for (const point of rest) pdf.lineTo(...point)
      pdf.stroke()
      continue
    }
    const [[x0, y0], [x1, y1]] = [at(shape.from), at(shape.to)]
    if (shape.shape === 'box') {
      pdf.rect(Math.min(x0, x1), Math.min(y0, y1), Math.abs(x1 - x0), Math.abs(y1 - y0)).stroke()
      continue
    }
    pdf.moveTo(x0, y0).lineTo(x1, y1).stroke()
    const turn = Math.atan2(y1 - y0, x1 - x0)
    for (const side of [-1, 1]) {
      const barb = turn + Math.PI + side * 0.42
      pdf
        .moveTo(x1, y1)
        .lineTo(x1 + 7 * Math.cos(barb), y1 + 7 * Math.sin(barb))
        .stroke()
    }
  }
}
