import { createPainter, type Painter } from './painter'
import { pagePacing } from './pacing'
import { readFrame, type Answer, type Order } from './protocol'
import { createSheet } from './sheet'

// The worker's end of ./protocol: paints on the canvas that was handed to it.
const answer = (message: Answer, lent: Transferable[] = []) => self.postMessage(message, { transfer: lent })

let painter: Painter | null = null
let parts = 0

self.onmessage = ({ data }: MessageEvent<Order>) => {
  if (data.kind === 'canvas') {
    const sheet = createSheet(data.canvas)
    painter = sheet && createPainter(sheet, pagePacing)
    return
  }
  if (!painter) return
  if (data.kind === 'rig') {
    parts = data.rig.parts.length
    painter.setRig(data.rig)
  } else if (data.kind === 'theme') painter.setTheme(data.theme)
  else if (data.kind === 'visibility') painter.setVisibility(data.visibility)
  else if (data.kind === 'size') painter.resize(data.width, data.height, data.ratio)
  else {
    const painted = painter.draw(readFrame(data.buffer, parts), data.still)
    answer({ kind: 'painted', buffer: data.buffer, painted }, [data.buffer])
  }
}

answer({ kind: 'able', able: new OffscreenCanvas(1, 1).getContext('2d') !== null })
