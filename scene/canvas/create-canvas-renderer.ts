import type { InkTheme, Renderer, Rig, Visibility } from '@/scene/frame/types'
import type { Painter } from './painter'
import { frameBytes, readFrame, writeFrame, type Answer, type Order, type Painted } from './protocol'
import type { RigShape } from './raster/prepare'

/**
 * Draws rig and frames in ink without a GPU: in a worker on an OffscreenCanvas, or on the page where either is
 * missing. `draw` answers false while it is being settled which, while no rig and theme are set, and while the last
 * frame is in the worker. `onReady` is told once, when the first picture is on the canvas; `onPainted` after each.
 * The canvas is used up: another renderer needs another one.
 */
export function createCanvasRenderer(
  canvas: HTMLCanvasElement,
  onReady?: () => void,
  onPainted?: (painted: Painted) => void,
): Renderer {
  let rig: RigShape | null = null
  let theme: InkTheme | null = null
  let visibility: Visibility | null = null
  let size = { width: 1, height: 1, ratio: 1 }
  let ready = false
  let busy = false
  let buffer: ArrayBuffer | null = null
  let worker: Worker | null = null
  let painter: Painter | null = null
  let settled = false
  let gone = false

  const tell = (painted: Painted) => {
    if (!ready) onReady?.()
    ready = true
    onPainted?.(painted)
  }

  const order = (message: Order, lent: Transferable[] = []) => worker?.postMessage(message, lent)

  const onPage = async () => {
    worker?.terminate()
    worker = null
    const { createPagePainter } = await import('./on-page')
    if (gone) return
    settled = true
    painter = createPagePainter(canvas)
    handOver()
  }

  const inWorker = () => {
    const offscreen = canvas.transferControlToOffscreen()
    settled = true
    order({ kind: 'canvas', canvas: offscreen }, [offscreen])
    handOver()
  }

  /** What was set while it was not settled who draws. */
  const handOver = () => {
    renderer.resize(size.width, size.height, size.ratio)
    if (theme) renderer.setTheme(theme)
    if (rig) sendRig(rig)
    if (visibility) renderer.setVisibility(visibility)
  }

  const sendRig = (next: RigShape) => {
    order({ kind: 'rig', rig: next })
    painter?.setRig(next)
  }

  const renderer: Renderer = {
    setRig({ meshes, parts, anchors }: Rig) {
      rig = { meshes, parts, anchors: { firing: anchors.firing } }
      visibility = null
      if (settled) sendRig(rig)
    },
    setTheme(next) {
      theme = { ...next }
      if (!settled) return
      order({ kind: 'theme', theme })
      painter?.setTheme(theme)
    },
    setVisibility(next) {
      visibility = next.slice()
      if (!settled) return
      order({ kind: 'visibility', visibility })
      painter?.setVisibility(visibility)
    },
    resize(width, height, ratio) {
      size = { width, height, ratio }
      if (!settled) return
      order({ kind: 'size', ...size })
      painter?.resize(width, height, ratio)
    },
    draw(frame) {
      if (busy || !settled || !rig || !theme) return false
      if (painter) tell(painter.draw(frame, frame.still))
      if (!worker) return painter !== null
      const bytes = frameBytes(rig.parts.length, rig.anchors.firing.length)
      if (buffer?.byteLength !== bytes) buffer = new ArrayBuffer(bytes)
      writeFrame(readFrame(buffer, rig.parts.length), frame)
      busy = true
      order({ kind: 'frame', buffer, still: frame.still }, [buffer])
      buffer = null
      return true
    },
    dispose() {
      gone = true
      worker?.terminate()
      painter?.dispose()
      worker = painter = rig = buffer = null
    },
  }

  if (
    typeof Worker === 'undefined' ||
    typeof OffscreenCanvas === 'undefined' ||
    !canvas.transferControlToOffscreen
  ) {
    void onPage()
    return renderer
  }
  worker = new Worker(new URL('./worker.ts', import.meta.url), { type: 'module' })
  worker.onmessage = ({ data }: MessageEvent<Answer>) => {
    if (gone) return
    if (data.kind === 'able') {
      if (data.able) inWorker()
      else void onPage()
      return
    }
    busy = false
    buffer = data.buffer
    tell(data.painted)
  }
  worker.onerror = () => {
    if (gone) return
    if (settled) busy = false
    else void onPage()
  }
  return renderer
}
