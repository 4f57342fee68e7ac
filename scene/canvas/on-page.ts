import { pagePacing } from './pacing'
import { createPainter, type Painter } from './painter'
import { fine } from './raster/fine'
import { createSheet } from './sheet'

/** The whole renderer on the page itself, fetched only where no worker can draw. */
export function createPagePainter(canvas: HTMLCanvasElement): Painter | null {
  const sheet = createSheet(canvas)
  return sheet && createPainter(sheet, pagePacing, fine)
}
