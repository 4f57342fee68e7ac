import type { Palette } from './palette'

/** LOOK's three forces: each a colour, a line and a head of its own. */
export type ArrowForm = 'gas' | 'inertia' | 'resultant'

export type Pen = CanvasRenderingContext2D

const headLength = 10
const headHalf = 4.5
/** Shorter than this is near nothing: a ring says so. */
export const nearNothing = 3

export const solid: number[] = []
const dashes = [5, 3]

export const formColour = (palette: Palette, form: ArrowForm): string =>
  form === 'gas' ? palette.gas : form === 'inertia' ? palette.inertia : palette.res

/** From the point of application to the tip, in CSS pixels, on a halo of paper. */
export function paintArrow(
  pen: Pen,
  palette: Palette,
  form: ArrowForm,
  x0: number,
  y0: number,
  x1: number,
  y1: number,
): void {
  const length = Math.hypot(x1 - x0, y1 - y0)
  if (length < nearNothing) {
    if (form === 'resultant') paintRing(pen, palette, x0, y0)
    return
  }
  const ux = (x1 - x0) / length
  const uy = (y1 - y0) / length
  const head = Math.min(headLength, length)
  const half = (headHalf * head) / headLength
  const bx = x1 - ux * head
  const by = y1 - uy * head
  pen.setLineDash(solid)
  pen.lineCap = 'butt'
  pen.lineJoin = 'miter'
  pen.globalAlpha = 0.85
  pen.strokeStyle = palette.paper
  pen.lineWidth = 7
  line(pen, x0, y0, x1, y1)
  pen.globalAlpha = 1
  shaft(pen, palette, form, x0, y0, bx, by)
  pen.beginPath()
  pen.moveTo(x1, y1)
  pen.lineTo(bx - uy * half, by + ux * half)
  pen.lineTo(bx + uy * half, by - ux * half)
  pen.closePath()
  pen.fillStyle = form === 'inertia' ? palette.paper : formColour(palette, form)
  pen.strokeStyle = formColour(palette, form)
  pen.lineWidth = form === 'inertia' ? 1.7 : 1
  pen.fill()
  pen.stroke()
}

function shaft(pen: Pen, palette: Palette, form: ArrowForm, x0: number, y0: number, x1: number, y1: number) {
  pen.strokeStyle = formColour(palette, form)
  if (form === 'inertia') pen.setLineDash(dashes)
  pen.lineWidth = form === 'gas' ? 2.6 : form === 'inertia' ? 2 : 5
  line(pen, x0, y0, x1, y1)
  pen.setLineDash(solid)
  if (form !== 'resultant') return
  // A double line is a broad one with paper down its middle.
  pen.strokeStyle = palette.paper
  pen.lineWidth = 1.6
  line(pen, x0, y0, x1, y1)
}

function line(pen: Pen, x0: number, y0: number, x1: number, y1: number) {
  pen.beginPath()
  pen.moveTo(x0, y0)
  pen.lineTo(x1, y1)
  pen.stroke()
}

/** Near nothing is left of the resultant: a double ring. */
export function paintRing(pen: Pen, palette: Palette, x: number, y: number): void {
  pen.setLineDash(solid)
  pen.strokeStyle = palette.res
  pen.lineWidth = 1.5
  for (let radius = 3.5; radius < 9; radius += 3.5) {
    pen.beginPath()
    pen.arc(x, y, radius, 0, 2 * Math.PI)
    pen.stroke()
  }
}
