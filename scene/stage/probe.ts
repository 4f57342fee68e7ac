import type { RendererKind } from './types'

export interface Choice {
  kind: RendererKind
  reason: string
}

const softwareNames = /swiftshader|llvmpipe|softpipe|software|basic render/i

/** What a WebGL context says of itself; null where none could be had. */
export const chooseRenderer = (asked: RendererKind | 'auto', gpu: string | null): Choice => {
  if (asked === 'canvas') return { kind: 'canvas', reason: 'Drawn without 3D graphics: you asked for it.' }
  if (gpu === null) return { kind: 'canvas', reason: 'Drawn without 3D graphics: this browser offers none.' }
  if (asked === 'webgl') return { kind: 'webgl', reason: 'Drawn with 3D graphics: you asked for it.' }
  if (softwareNames.test(gpu))
    return {
      kind: 'canvas',
      reason: 'Drawn without 3D graphics: this computer would only imitate them, slowly.',
    }
  return { kind: 'webgl', reason: 'Drawn with 3D graphics.' }
}

/** The unmasked name of what draws WebGL 2 here ('' where it is kept secret), or null. The context is given back at once. */
export function readGpu(): string | null {
  const context = document.createElement('canvas').getContext('webgl2')
  if (!context) return null
  const info = context.getExtension('WEBGL_debug_renderer_info')
  const name = String(context.getParameter(info ? info.UNMASKED_RENDERER_WEBGL : context.RENDERER) ?? '')
  context.getExtension('WEBGL_lose_context')?.loseContext()
  return name
}

let known: string | null | undefined

/** Asked once a page: a probe costs a context. */
export const probe = (asked: RendererKind | 'auto'): Choice => {
  if (asked === 'canvas') return chooseRenderer(asked, null)
  if (known === undefined) known = readGpu()
  return chooseRenderer(asked, known)
}
