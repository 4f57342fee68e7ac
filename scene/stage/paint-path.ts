import { solid, type Pen } from './paint-arrow'
import type { Palette } from './palette'

/** Which line a path on the sheet is drawn with. */
export type PathForm = 'orbit' | 'couple' | 'rotation'

const orbitDashes = [2, 3]

/**
 * A path through `count` points (x, y in turn from `from`) on the sheet. The couple's arc is a double line with a head, the
 * arrow of rotation a thin one with a head, the orbit of the resultant's tip a fine dotted loop.
 */
export function paintPath(
  pen: Pen,
  palette: Palette,
  form: PathForm,
  points: Float64Array,
  count: number,
): void {
  if (count < 2) return
  pen.lineJoin = 'round'
  pen.lineCap = 'butt'
  pen.setLineDash(form === 'orbit' ? orbitDashes : solid)
  trace(pen, points, count, form === 'orbit')
  if (form === 'couple') {
    stroke(pen, palette.paper, 8)
    stroke(pen, palette.res, 5)
    stroke(pen, palette.paper, 1.6)
    head(pen, palette.res, points, count, 10)
  } else if (form === 'rotation') {
    stroke(pen, palette.ink, 1.2)
    head(pen, palette.ink, points, count, 8)
  } else stroke(pen, palette.res, 1)
  pen.setLineDash(solid)
}

function trace(pen: Pen, points: Float64Array, count: number, closed: boolean) {
  pen.beginPath()
  pen.moveTo(points[0], points[1])
  for (let i = 1; i < count; i++) pen.lineTo(points[2 * i], points[2 * i + 1])
  if (closed) pen.closePath()
}

function stroke(pen: Pen, colour: string, width: number) {
  pen.strokeStyle = colour
  pen.lineWidth = width
  pen.stroke()
}

function head(pen: Pen, colour: string, points: Float64Array, count: number, size: number) {
  const x = points[2 * count - 2]
  const y = points[2 * count - 1]
  const dx = x - points[2 * count - 4]
  const dy = y - points[2 * count - 3]
  const length = Math.hypot(dx, dy)
  if (length === 0) return
  const ux = dx / length
  const uy = dy / length
  // The head sits on the end of the line, its tip just beyond.
  const tx = x + ux * size * 0.6
  const ty = y + uy * size * 0.6
  pen.beginPath()
  pen.moveTo(tx, ty)
  pen.lineTo(tx - ux * size - uy * size * 0.45, ty - uy * size + ux * size * 0.45)
  pen.lineTo(tx - ux * size + uy * size * 0.45, ty - uy * size - ux * size * 0.45)
  pen.closePath()
  pen.fillStyle = colour
  pen.fill()
}
