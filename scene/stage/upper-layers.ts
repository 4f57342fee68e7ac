import { adoptSheetStyle } from './sheet-style'

/** What lies over the engine, from below: the vectors, what takes the pointer, what is written. */
export interface UpperLayers {
  pen: CanvasRenderingContext2D
  surface: HTMLElement
  written: HTMLElement
  resize(width: number, height: number, ratio: number): void
  remove(): void
}

/** Where nothing is pointed at, the surface lets the pointer through. */
export function createUpperLayers(host: HTMLElement, pointed: boolean): UpperLayers {
  adoptSheetStyle()
  const make = <K extends 'canvas' | 'div'>(tag: K, ...classes: string[]) => {
    const element = document.createElement(tag)
    element.classList.add('stage-layer', ...classes)
    return element
  }
  const overlay = make('canvas', 'stage-over')
  overlay.setAttribute('aria-hidden', 'true')
  const surface = make('div', pointed ? 'stage-surface' : 'stage-over')
  const written = make('div', 'stage-over', 'stage-written')
  host.append(overlay, surface, written)
  const pen = overlay.getContext('2d')
  if (!pen) throw new Error('this browser offers no 2D canvas')
  return {
    pen,
    surface,
    written,
    resize(width, height, ratio) {
      const wide = Math.round(width * ratio)
      const high = Math.round(height * ratio)
      if (overlay.width === wide && overlay.height === high) return
      overlay.width = wide
      overlay.height = high
      pen.setTransform(ratio, 0, 0, ratio, 0, 0)
    },
    remove() {
      for (const layer of [overlay, surface, written]) layer.remove()
    },
  }
}
