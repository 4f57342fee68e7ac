import type { Palette } from './palette'
import { solid, type Pen } from './paint-arrow'

/** A firing: filled while the charge burns, open for the same event a cycle on. */
export function paintDiamond(
  pen: Pen,
  palette: Palette,
  x: number,
  y: number,
  half: number,
  filled: boolean,
): void {
  pen.setLineDash(solid)
  diamond(pen, x, y, half + 2)
  pen.fillStyle = palette.paper
  pen.fill()
  diamond(pen, x, y, half)
  if (filled) {
    pen.fillStyle = palette.fire
    pen.fill()
    return
  }
  pen.strokeStyle = palette.fire
  pen.lineWidth = 1.2
  pen.stroke()
}

function diamond(pen: Pen, x: number, y: number, half: number) {
  pen.beginPath()
  pen.moveTo(x, y - half)
  pen.lineTo(x + half, y)
  pen.lineTo(x, y + half)
  pen.lineTo(x - half, y)
  pen.closePath()
}
