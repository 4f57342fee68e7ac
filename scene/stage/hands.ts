import { orbit, zoom } from '@/scene/frame/camera-moves'
import type { Camera } from '@/scene/frame/types'
import type { Clock } from '@/scene/session/clock'
import { drag, shove, zoomAt } from './camera-moves'
import { listenToGestures, type Point } from './gestures'
import { listenToKeys } from './keys'
import type { NamedView } from './types'

/** What pointer and keys may do to a stage. */
export interface Handled {
  clock: Clock
  camera: Camera
  /** Null before there is anything to look at. */
  sheet(): { width: number; height: number; bounds: Float64Array } | null
  move(camera: Camera): void
  /** The move is over. */
  moved(): void
  view(name: NamedView): void
  pick(at: Point): void
  hover(at: Point | null): void
}

/** Lays hands on a stage; the answer takes them off. */
export function layHands(host: HTMLElement, surface: HTMLElement, stage: Handled): () => void {
  const { camera, clock } = stage
  const offGestures = listenToGestures(surface, {
    orbit: (dx, dy) => stage.move(drag(camera, dx, dy)),
    pan(dx, dy) {
      const sheet = stage.sheet()
      if (sheet) stage.move(shove(camera, dx, dy, sheet.height))
    },
    zoom(factor, x, y) {
      const sheet = stage.sheet()
      if (!sheet) return
      const { width, height, bounds } = sheet
      stage.move(zoomAt(camera, factor, x - width / 2, y - height / 2, height, bounds))
    },
    end: () => stage.moved(),
    click(x, y) {
      host.focus({ preventScroll: true })
      stage.pick({ x, y })
    },
    hover: (at) => stage.hover(at),
  })
  const offKeys = listenToKeys(host, (intent) => {
    if (intent.kind === 'view') return stage.view(intent.name)
    if (intent.kind === 'home') return stage.view('free')
    if (intent.kind === 'play') return clock.playing ? clock.pause() : clock.play()
    if (intent.kind === 'step') {
      clock.pause()
      return clock.setAngle(clock.angle + intent.angle)
    }
    const sheet = stage.sheet()
    if (!sheet) return
    stage.move(
      intent.kind === 'orbit'
        ? orbit(camera, intent.yaw, intent.pitch)
        : zoom(camera, intent.factor, sheet.bounds),
    )
    stage.moved()
  })
  return () => {
    offGestures()
    offKeys()
  }
}
