import { adoptSheetStyle } from './sheet-style'

/** What lies in the host, from below: the engine, the vectors over it, what takes the pointer, what is written. */
export interface Layers {
  readonly engine: HTMLCanvasElement
  overlay: HTMLCanvasElement
  pen: CanvasRenderingContext2D
  surface: HTMLElement
  written: HTMLElement
  /** A canvas serves one kind of context for life: a new renderer gets a new one, and takes its place when it can draw. */
  makeEngine(): HTMLCanvasElement
  setEngine(canvas: HTMLCanvasElement): void
  resize(width: number, height: number, ratio: number): void
  remove(): void
}

export function createLayers(host: HTMLElement): Layers {
  adoptSheetStyle()
  const make = <K extends 'canvas' | 'div'>(tag: K, ...classes: string[]) => {
    const element = document.createElement(tag)
    element.classList.add('stage-layer', ...classes)
    return element
  }
  const makeEngine = () => {
    const canvas = make('canvas', 'stage-engine')
    canvas.setAttribute('aria-hidden', 'true')
    return canvas
  }
  let engine = makeEngine()
  const overlay = make('canvas', 'stage-over')
  overlay.setAttribute('aria-hidden', 'true')
  const surface = make('div', 'stage-surface')
  const written = make('div', 'stage-over', 'stage-written')
  host.append(engine, overlay, surface, written)
  const pen = overlay.getContext('2d')
  if (!pen) throw new Error('this browser offers no 2D canvas')
  return {
    get engine() {
      return engine
    },
    overlay,
    pen,
    surface,
    written,
    makeEngine,
    setEngine(canvas) {
      engine.replaceWith(canvas)
      engine = canvas
    },
    resize(width, height, ratio) {
      const wide = Math.round(width * ratio)
      const high = Math.round(height * ratio)
      if (overlay.width === wide && overlay.height === high) return
      overlay.width = wide
      overlay.height = high
      pen.setTransform(ratio, 0, 0, ratio, 0, 0)
    },
    remove() {
      for (const layer of [engine, overlay, surface, written]) layer.remove()
    },
  }
}
