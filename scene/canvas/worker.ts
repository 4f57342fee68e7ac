import { createPainter, type Painter } from './painter'
import { pagePacing } from './pacing'
import { readFrame, type Answer, type Order } from './protocol'
import { createSheet } from './sheet'

// The worker's end of ./protocol: paints on the canvas that was handed to it.
const answer = (message: Answer, lent: Transferable[] = []) => self.postMessage(message, { transfer: lent })

let painter: Painter | null = null
let parts = 0
let frames = 0
let fine: Promise<void> | null = null

/** Once the engine has moved, or where it stands still: what moves does not wait for it. */
const makeFine = (): Promise<void> =>
  (fine ??= import('./raster/fine').then(
    (module) => painter?.enrich(module.fine),
    // without it the picture is plainer; it is asked for again with the next still one
    () => void (fine = null),
  ))

async function carryOut(data: Order): Promise<void> {
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
    // two pictures have been seen when the third is asked for
    frames++
    if (data.still) await makeFine()
    else if (frames === 3) void makeFine()
    const painted = painter.draw(readFrame(data.buffer, parts), data.still)
    answer({ kind: 'painted', buffer: data.buffer, painted }, [data.buffer])
  }
}

/** In the order in which they came, also where one of them has to wait. */
let last = Promise.resolve()
self.onmessage = ({ data }: MessageEvent<Order>) => {
  last = last.then(() => carryOut(data)).catch(reportError)
}

answer({ kind: 'able', able: new OffscreenCanvas(1, 1).getContext('2d') !== null })
