/** What lies at the bottom of the host: the engine. */
export interface Layers {
  readonly engine: HTMLCanvasElement
  /** A canvas serves one kind of context for life: a new renderer gets a new one, and takes its place when it can draw. */
  makeEngine(): HTMLCanvasElement
  setEngine(canvas: HTMLCanvasElement): void
  remove(): void
}

export function createLayers(host: HTMLElement): Layers {
  const makeEngine = () => {
    const canvas = document.createElement('canvas')
    canvas.className = 'stage-engine'
    canvas.style.cssText =
      'position:absolute;inset:0;width:100%;height:100%;display:block;background:var(--paper)'
    canvas.setAttribute('aria-hidden', 'true')
    return canvas
  }
  let engine = makeEngine()
  host.prepend(engine)
  return {
    get engine() {
      return engine
    },
    makeEngine,
    setEngine(canvas) {
      engine.replaceWith(canvas)
      engine = canvas
    },
    remove: () => engine.remove(),
  }
}
