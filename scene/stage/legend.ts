import { formColour, paintArrow, solid, type ArrowForm, type Pen } from './paint-arrow'
import type { Palette } from './palette'
import type { ScaleBar } from './scale-bar'

export interface LegendRow {
  form: ArrowForm
  text: string
}

const width = 150
const margin = 12
const firstRow = 20
const rowHeight = 18

/** What it takes of the sheet's top right corner. */
export const legendRoom = (rows: LegendRow[]) =>
  rows.length === 0
    ? { width: 0, height: 0 }
    : { width: width + 2 * margin, height: firstRow + rowHeight * (rows.length + 1) + margin }

/** The one scale of force as a bar with its value, and what the vectors are, at the sheet's top right. */
export function paintLegend(
  pen: Pen,
  palette: Palette,
  sheetWidth: number,
  bar: ScaleBar,
  rows: LegendRow[],
): void {
  if (rows.length === 0) return
  const left = sheetWidth - width - margin
  let y = firstRow
  const room = legendRoom(rows)
  pen.globalAlpha = 0.85
  pen.fillStyle = palette.paper
  pen.fillRect(sheetWidth - room.width, 0, room.width, room.height)
  pen.globalAlpha = 1
  pen.setLineDash(solid)
  pen.textBaseline = 'middle'
  pen.textAlign = 'left'
  pen.fillStyle = palette.ink
  pen.font = palette.headFont
  pen.fillText('Forces', left, y)
  // the bar has a row of its own: beside the word a long one would run into it
  y += rowHeight
  pen.font = palette.figureFont
  pen.fillText(bar.label, left + bar.length + 8, y)
  ticked(pen, palette, left, left + bar.length, y)
  for (const { form, text } of rows) {
    y += rowHeight
    paintArrow(pen, palette, form, left, y, left + 34, y)
    pen.font = palette.textFont
    pen.textAlign = 'left'
    pen.fillStyle = form === 'gas' ? palette['gas-ink'] : formColour(palette, form)
    pen.fillText(text, left + 44, y + 0.5)
  }
}

function ticked(pen: Pen, palette: Palette, from: number, to: number, y: number) {
  pen.strokeStyle = palette.ink
  pen.lineWidth = 1
  pen.beginPath()
  pen.moveTo(from, y)
  pen.lineTo(to, y)
  pen.moveTo(from, y - 4)
  pen.lineTo(from, y + 4)
  pen.moveTo(to, y - 4)
  pen.lineTo(to, y + 4)
  pen.stroke()
}
