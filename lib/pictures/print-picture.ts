import type { InkTheme } from '@/scene/frame/types'
import type { Scene } from '@/scene/model/scene'
import { drawScene, inkThemes } from './scene-picture'

/** Print is black on white, with the two flat tones of the drawing. */
export const printTheme: InkTheme = {
  ...inkThemes.light,
  paper: 0xffffff,
  part: 0xe7e5df,
  metal: 0xffffff,
  ink: 0x15191c,
}

/** Dots an inch: of the sheet, and of the page that the manner of the drawing is measured on. */
const dpi = 220
const pageDpi = 96
const pointsAnInch = 72

/** The engine for a place on paper, in points. */
export const drawForPrint = (
  scene: Scene,
  { width, height }: { width: number; height: number },
): Promise<Buffer> =>
  drawScene(scene, printTheme, {
    width: Math.round((width * dpi) / pointsAnInch),
    height: Math.round((height * dpi) / pointsAnInch),
    ratio: dpi / pageDpi,
  })
