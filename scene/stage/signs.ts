import type { RendererKind } from './types'

/** What the host says of its drawing to tests and to whoever assists: attributes, written now and then. */
export interface Signs {
  renderer(kind: RendererKind): void
  /** A picture is on the sheet; true once two of them stood at two angles. */
  drawn(now: number, angle: number, still: boolean): boolean
  clear(): void
}

/** Between two writes while the engine moves, ms. */
const seldom = 500

export function createSigns(host: HTMLElement): Signs {
  let frames = 0
  let written = -Infinity
  let stillShown = false
  let first = NaN
  let moves = false
  return {
    renderer(kind) {
      host.dataset.renderer = kind
    },
    drawn(now, angle, still) {
      if (frames++ === 0) first = angle
      if (!moves && angle !== first) {
        moves = true
        performance.mark('moving', { detail: host.dataset.renderer })
      }
      if (stillShown !== still) host.dataset.still = String(still)
      stillShown = still
      if (still || now - written >= seldom) {
        written = now
        host.dataset.frames = String(frames)
        host.dataset.angle = ((angle * 180) / Math.PI).toFixed(2)
      }
      return moves
    },
    clear() {
      for (const name of ['renderer', 'frames', 'angle', 'still']) delete host.dataset[name]
    },
  }
}
