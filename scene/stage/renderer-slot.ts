import type { Renderer } from '@/scene/frame/types'
import type { Layers } from './layers'
import { loadRenderer } from './load-renderer'
import { probe, type Choice } from './probe'
import type { RendererKind } from './types'

/** Holds the renderer that draws now, brings another one in, and falls to the canvas when the graphics fail. */
export interface RendererSlot {
  readonly current: Renderer | null
  readonly kind: RendererKind | null
  want(asked: RendererKind | 'auto'): void
  /** WebGL has turned out too slow. */
  tooSlow(): void
  dispose(): void
}

export interface SlotEvents {
  /** A new renderer stands in an empty canvas: tell it everything. */
  onStanding(renderer: Renderer): void
  /** A picture that was asked for is on the sheet. */
  onPainted(): void
  onChoice(choice: Choice): void
}

const without = (why: string): Choice => ({ kind: 'canvas', reason: `Drawn without 3D graphics: ${why}.` })

export function createRendererSlot(layers: Layers, events: SlotEvents): RendererSlot {
  let current: Renderer | null = null
  let kind: RendererKind | null = null
  /** A choice that was overtaken, or a stage that has gone, must not bring its renderer in. */
  let turn = 0
  let gone = false

  const dismiss = () => {
    current?.dispose()
    current = null
  }

  const lost = (event: Event) => {
    event.preventDefault()
    if (gone || event.target !== layers.engine) return
    void bring(without('the graphics processor was lost'))
  }

  const bring = async (choice: Choice): Promise<void> => {
    const mine = ++turn
    kind = choice.kind
    const canvas = layers.makeEngine()
    try {
      const renderer = await loadRenderer(choice.kind, canvas, () => mine === turn && events.onPainted())
      if (mine !== turn) return renderer.dispose()
      dismiss()
      canvas.addEventListener('webglcontextlost', lost)
      layers.setEngine(canvas)
      current = renderer
      events.onStanding(renderer)
      events.onChoice(choice)
    } catch (error) {
      if (mine !== turn) return
      if (choice.kind === 'webgl') return bring(without('starting them failed'))
      events.onChoice({ kind: 'canvas', reason: 'The drawing could not be loaded.' })
      throw error
    }
  }

  return {
    get current() {
      return current
    },
    get kind() {
      return kind
    },
    want(asked) {
      const choice = probe(asked)
      if (choice.kind !== kind) void bring(choice)
      else if (current) events.onChoice(choice)
    },
    tooSlow: () => void bring(without('they are too slow here')),
    dispose() {
      gone = true
      turn++
      dismiss()
    },
  }
}
