import { solid, type Pen } from './paint-arrow'
import type { Palette } from './palette'

/** How a leader ends: in a dot on what is seen, in a ring on what stands behind. */
export interface LeaderForm {
  colour: string
  width: number
  dot: number
  dashes: readonly number[]
}

/** From the rim of a mark to a point of the drawing, with paper on both sides. */
export function paintLeader(
  pen: Pen,
  palette: Palette,
  form: LeaderForm,
  rim: number,
  x: number,
  y: number,
  toX: number,
  toY: number,
): void {
  const dx = toX - x
  const dy = toY - y
  const length = Math.hypot(dx, dy)
  if (length <= rim) return
  pen.setLineDash(solid)
  pen.beginPath()
  pen.moveTo(x + (dx * rim) / length, y + (dy * rim) / length)
  pen.lineTo(toX, toY)
  pen.globalAlpha = 0.75
  pen.strokeStyle = palette.paper
  pen.lineWidth = 3
  pen.stroke()
  pen.globalAlpha = 1
  pen.setLineDash(form.dashes)
  pen.strokeStyle = form.colour
  pen.lineWidth = form.width
  pen.stroke()
  pen.setLineDash(solid)
  paintEnd(pen, palette, form, toX, toY)
}

/** The end of a leader, also of a mark that has no room for one. */
export function paintEnd(pen: Pen, palette: Palette, form: LeaderForm, x: number, y: number): void {
  pen.beginPath()
  pen.arc(x, y, form.dot, 0, 2 * Math.PI)
  if (form.dashes === solid) {
    pen.fillStyle = form.colour
    pen.fill()
    return
  }
  pen.fillStyle = palette.paper
  pen.fill()
  pen.strokeStyle = form.colour
  pen.lineWidth = form.width
  pen.stroke()
}
