import type { Renderer } from '@/scene/frame/types'
import type { RendererKind } from './types'

/** `onPainted` tells that a picture asked for is on the canvas. Each renderer is a chunk of its own: a page loads the one that it draws with. */
export async function loadRenderer(
  kind: RendererKind,
  canvas: HTMLCanvasElement,
  onPainted: () => void,
): Promise<Renderer> {
  if (kind === 'webgl') {
    const { createWebglRenderer } = await import('@/scene/webgl/create-webgl-renderer')
    return createWebglRenderer(canvas, onPainted)
  }
  const { createCanvasRenderer } = await import('@/scene/canvas/create-canvas-renderer')
  return createCanvasRenderer(canvas, undefined, onPainted)
}
