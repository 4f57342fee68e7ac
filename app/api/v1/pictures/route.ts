import { pictureOf } from '@/lib/contracts/models'
import { handle } from '@/lib/http/handle'
import { printedScene } from '@/lib/services/printed-scene'
import { fileResponse } from '../file-response'
import { printTheme } from '@/lib/pictures/print-picture'
import { drawScene } from '@/lib/pictures/scene-picture'

export const POST = handle(pictureOf, async ({ body }) => {
  const { width, height, theme } = body
  const size = { width, height, ratio: Math.max(1, Math.min(width, height) / 800) }
  const png = await drawScene(printedScene(body), theme === 'print' ? printTheme : theme, size)
  return fileResponse(Uint8Array.from(png), 'image/png', 'crank-train.png')
})
